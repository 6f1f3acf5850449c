import Papa from "papaparse";
import type { Cell } from "../../../../call/cell.js";
import { columnOf } from "../../../../call/column.js";
import { cellOfField } from "../../../../files/cell/cellOfField.js";
import type { Area, Place } from "../../../../sheet/book/book.js";
import type { Span } from "../../../../sheet/book/spans.js";
import type { Edit } from "../../../../sheet/edit/draft.js";
import { pasteCells } from "../../../../sheet/edit/pasteCells.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import { setColumn } from "../../../../sheet/edit/setColumn.js";
import { mostColumns, mostRows } from "../../../../sheet/limits.js";
import type { Action } from "../../protocol/request.js";
import { bookOfSession, type Session } from "../session.js";
import { countRows, nextVisibleSpans } from "../view/visibleRows.js";
import type { OwnClip } from "./clips.js";
import type { Plan } from "./plan.js";
import { areaWords, columnNames, counted } from "./words.js";

type Paste = Extract<Action, { do: "paste" }>;

/** Puts what was copied to a place: from this page with its formulas, from elsewhere as the cells its text means. */
export function paste(session: Session, action: Paste, clip: OwnClip | undefined): Plan {
  const own = clip !== undefined && clip.token === action.clipboard.own ? clip : undefined;
  const copied = own ? sizeOf(own) : undefined;
  const cells = own ? [] : cellsOfText(action.clipboard.text);
  const rows = copied?.rows ?? cells.length;
  const columns = copied?.columns ?? Math.max(0, ...cells.map((line) => line.length));
  if (rows === 0 || columns === 0) {
    throw new EditRefused("paste: the clipboard holds no text; copy cells or text before");
  }
  const [down, across] = repeats(action.over, rows, columns);
  const { sheet, row, column } = action.place;
  const spans = nextVisibleSpans(session, sheet, row, rows * down);
  refuseTooLarge(spans, column + columns * across, rows * down, columns * across);
  const edits: Edit[] = [];
  for (let turn = 0; turn < across; turn++) {
    const left = column + turn * columns;
    if (own) edits.push(...ownEdits(own, { sheet, row, column: left }, spans, rows, action.what));
    else edits.push(...textEdits(cells, { sheet, row, column: left }, spans, columns));
  }
  const edited = spans.map(
    ({ from, to }): Area => ({ sheet, top: from, bottom: to - 1, left: column, right: column + columns * across - 1 }),
  );
  const bottom = (spans.at(-1)?.to ?? row + 1) - 1;
  const select: Area = { sheet, top: row, left: column, bottom, right: column + columns * across - 1 };
  return { name: nameOf(session, select, rows * down), edits, edited, select };
}

function sizeOf({ area, rows }: OwnClip): { readonly rows: number; readonly columns: number } {
  return { rows: countRows(rows), columns: area.right - area.left + 1 };
}

/** How often what was copied fits into the selection, where it fits exactly; else once. */
function repeats(over: Area | undefined, rows: number, columns: number): readonly [number, number] {
  if (!over) return [1, 1];
  const height = over.bottom - over.top + 1;
  const width = over.right - over.left + 1;
  return height % rows === 0 && width % columns === 0 ? [height / rows, width / columns] : [1, 1];
}

function refuseTooLarge(spans: readonly Span[], right: number, rows: number, columns: number): void {
  const bottom = spans.at(-1)?.to ?? 0;
  if (bottom <= mostRows && right <= mostColumns) return;
  const room = `the sheet ends at row ${mostRows.toLocaleString("en")} and column ${mostColumns.toLocaleString("en")}`;
  throw new EditRefused(
    `paste: ${rows.toLocaleString("en")} x ${columns.toLocaleString("en")} cells do not fit from there on; ${room}; paste higher up or further left, or copy less`,
  );
}

/** Spans of the copied rows onto spans of the rows in view, piece by piece. */
function ownEdits(
  { book, area, rows }: OwnClip,
  place: Place,
  spans: readonly Span[],
  height: number,
  what: Paste["what"],
): Edit[] {
  const edits: Edit[] = [];
  let done = 0;
  for (const { from, to } of spans) {
    for (let row = from; row < to; ) {
      const source = rowsFrom(rows, done % height);
      const count = Math.min(to - row, source.to - source.from);
      const part: Area = { ...area, top: source.from, bottom: source.from + count - 1 };
      edits.push(pasteCells({ book, area: part }, { ...place, row }, what));
      row += count;
      done += count;
    }
  }
  return edits;
}

/** What is left of the span in which the row of a number lies, from that row on. */
function rowsFrom(rows: readonly Span[], index: number): Span {
  let before = 0;
  for (const { from, to } of rows) {
    if (index < before + to - from) return { from: from + index - before, to };
    before += to - from;
  }
  throw new RangeError(`row ${index} of ${before} copied rows`);
}

function textEdits(cells: readonly (readonly Cell[])[], place: Place, spans: readonly Span[], columns: number): Edit[] {
  const edits: Edit[] = [];
  let done = 0;
  for (const { from, to } of spans) {
    for (let across = 0; across < columns; across++) {
      const values = Array.from({ length: to - from }, (_, index): Cell => {
        return cells[(done + index) % cells.length]?.[across] ?? null;
      });
      edits.push(setColumn({ ...place, row: from, column: place.column + across }, columnOf(values)));
    }
    done += to - from;
  }
  return edits;
}

/**
 * Lines of fields between tabs, quoted where they hold tabs or line ends; read as the fields of a file are. A quote that
 * is never closed is a character like any other.
 */
export function cellsOfText(text: string): Cell[][] {
  const whole = text.replace(/\r\n?/g, "\n").replace(/\n$/, "");
  if (whole === "") return [];
  const { data, errors } = Papa.parse<string[]>(whole, { delimiter: "\t", newline: "\n" });
  const isTorn = errors.some(({ code }) => code === "MissingQuotes");
  const lines = isTorn ? whole.split("\n").map((line) => line.split("\t")) : data;
  return lines.map((line) => line.map(cellOfField));
}

function nameOf(session: Session, select: Area, rows: number): string {
  const book = bookOfSession(session);
  if (select.top === 0) {
    const what = columnNames(book, select.sheet, select.left, select.right);
    return rows === 1 ? `pasted the header of ${what}` : `pasted ${counted(rows - 1, "row")} with headers`;
  }
  return `pasted ${areaWords(book, select, rows)}`;
}
