import type { Span } from "../../../../sheet/book/spans.js";
import type { Session, SheetFilter } from "../session.js";

/** The number of the first of sorted rows that is at or after `row`. */
export function indexOfRow(rows: Int32Array, row: number): number {
  let low = 0;
  let high = rows.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((rows[middle] as number) < row) low = middle + 1;
    else high = middle;
  }
  return low;
}

export function isVisible(filter: SheetFilter | undefined, row: number): boolean {
  if (filter === undefined || row >= filter.end) return true;
  return filter.rows[indexOfRow(filter.rows, row)] === row;
}

/** The sheet's row of a row in view. Below the rows a filter has looked at come the blank ones. */
export function sheetRowOf(filter: SheetFilter | undefined, viewRow: number): number {
  if (filter === undefined) return viewRow;
  const { rows, end } = filter;
  return viewRow < rows.length ? (rows[viewRow] as number) : end + viewRow - rows.length;
}

/** The rows in view of `from` up to `to`, as spans of rows that lie together. */
export function visibleSpans({ filters }: Session, sheet: number, from: number, to: number): readonly Span[] {
  const filter = filters[sheet];
  if (filter === undefined) return from < to ? [{ from, to }] : [];
  const { rows, end } = filter;
  const spans: { from: number; to: number }[] = [];
  const add = (start: number, stop: number): void => {
    const last = spans.at(-1);
    if (last?.to === start) last.to = stop;
    else spans.push({ from: start, to: stop });
  };
  for (let index = indexOfRow(rows, from); index < rows.length && (rows[index] as number) < to; index++) {
    add(rows[index] as number, (rows[index] as number) + 1);
  }
  if (to > end) add(Math.max(from, end), to);
  return spans;
}

/** So many rows in view from a row on, as spans. */
export function nextVisibleSpans(session: Session, sheet: number, from: number, count: number): readonly Span[] {
  const filter = session.filters[sheet];
  if (filter === undefined) return [{ from, to: from + count }];
  const seen = filter.rows.length - indexOfRow(filter.rows, from);
  const last =
    count <= seen ? sheetRowOf(filter, filter.rows.length - seen + count - 1) : filter.end + count - seen - 1;
  return visibleSpans(session, sheet, from, Math.max(last, from) + 1);
}

export function countRows(spans: readonly Span[]): number {
  return spans.reduce((sum, { from, to }) => sum + to - from, 0);
}
