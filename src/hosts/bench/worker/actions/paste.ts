import type { Cell } from "../../../../call/cell.js";
import { columnOf } from "../../../../call/column.js";
import { type ClipboardTable, entriesAt } from "../../../../files/clipboard/clipboardTable.js";
import type { Area, Place } from "../../../../sheet/book/book.js";
import type { Span } from "../../../../sheet/book/spans.js";
import type { Edit } from "../../../../sheet/edit/draft.js";
import { pasteCells } from "../../../../sheet/edit/pasteCells.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import { type Entry, setCells } from "../../../../sheet/edit/setCells.js";
import { setColumn } from "../../../../sheet/edit/setColumn.js";
import { mostColumns, mostRows } from "../../../../sheet/limits.js";
import type { Action } from "../../protocol/request.js";
import { functions } from "../functions.js";
import { bookOfSession, type Session } from "../session.js";
import { countRows, nextVisibleSpans } from "../view/visibleRows.js";
import { clipboardEntries } from "./clipboardEntries.js";
import type { OwnClip } from "./clips.js";
import type { Plan } from "./plan.js";
import { areaWords, columnNames, counted } from "./words.js";

type Paste = Extract<Action, { do: "paste" }>;

/** Puts what was copied to a place: from this page with its formulas, from elsewhere as the cells its text means. */
export function paste(session: Session, action: Paste, clip: OwnClip | undefined): Plan {
  const own = clip !== undefined && clip.token === action.clipboard.own ? clip : undefined;
  const copied = own ? sizeOf(own) : undefined;
  const table = own ? undefined : clipboardEntries(action.clipboard, action.what);
  const rows = copied?.rows ?? table?.rows.length ?? 0;
  const columns = copied?.columns ?? table?.rows[0]?.length ?? 0;
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
    else if (table) edits.push(...tableEdits(table, { sheet, row, column: left }, spans));
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

/** What was copied elsewhere, as often as there are rows for it. */
function tableEdits(table: ClipboardTable, place: Place, spans: readonly Span[]): Edit[] {
  const { rows, origin = place } = table;
  const hasFormulas = rows.some((row) => row.some(isFormula));
  const edits: Edit[] = [];
  let done = 0;
  for (const { from, to } of spans) {
    if (!hasFormulas)
      edits.push(...columnEdits(rows as readonly (readonly Cell[])[], { ...place, row: from }, to, done));
    for (let row = from; hasFormulas && row < to; ) {
      const first = (done + row - from) % rows.length;
      const part = rows.slice(first, first + to - row);
      const source = { rows: part, origin: { ...origin, row: origin.row + first } };
      edits.push(setCells({ ...place, row }, entriesAt(source, { ...place, row }, functions)));
      row += part.length;
    }
    done += to - from;
  }
  return edits;
}

function columnEdits(rows: readonly (readonly Cell[])[], place: Place, to: number, done: number): Edit[] {
  return Array.from({ length: rows[0]?.length ?? 0 }, (_, across) => {
    const values = Array.from({ length: to - place.row }, (_, index): Cell => {
      return rows[(done + index) % rows.length]?.[across] ?? null;
    });
    return setColumn({ ...place, column: place.column + across }, columnOf(values));
  });
}

function isFormula(entry: Entry): boolean {
  return typeof entry === "object" && entry !== null && "formula" in entry;
}

function nameOf(session: Session, select: Area, rows: number): string {
  const book = bookOfSession(session);
  if (select.top === 0) {
    const what = columnNames(book, select.sheet, select.left, select.right);
    return rows === 1 ? `pasted the header of ${what}` : `pasted ${counted(rows - 1, "row")} with headers`;
  }
  return `pasted ${areaWords(book, select, rows)}`;
}
