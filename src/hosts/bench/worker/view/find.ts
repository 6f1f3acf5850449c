import { CellError } from "../../../../call/cell.js";
import type { Book, Place } from "../../../../sheet/book/book.js";
import { columnAt } from "../../../../sheet/book/book.js";
import { sliceCells } from "../../../../sheet/book/cells.js";
import { type Span, spansIn } from "../../../../sheet/book/spans.js";
import { findCells } from "../../../../sheet/view/findCells.js";
import type { FindOptions } from "../../protocol/request.js";
import { bookOfSession, type Session } from "../session.js";
import { errorsInChunk } from "../state/errorCount.js";
import { sheetSize } from "../state/sheetSize.js";
import { isVisible } from "./visibleRows.js";

/** Rows looked through at a time: the next hit is most often near. */
const blockRows = 2048;

/**
 * The next cell that holds a text, row by row from a place on, then on the other sheets, and from the first cell again;
 * rows that a filter hides are passed over.
 */
export function find(session: Session, options: FindOptions, after: Place, backwards: boolean): Place | undefined {
  if (options.text === "") return undefined;
  const book = bookOfSession(session);
  const sheets = book.sheets.length;
  for (let turn = 0; turn <= sheets; turn++) {
    const sheet = (after.sheet + (backwards ? sheets - turn : turn) + sheets) % sheets;
    const isFirst = turn === 0;
    const isLast = turn === sheets;
    const accepts = (place: Place): boolean => {
      if (!isVisible(session.filters[sheet], place.row)) return false;
      if (!isFirst && !isLast) return true;
      return comparePlaces(place, after) * (backwards ? -1 : 1) > 0 === isFirst;
    };
    const { rows } = sheetSize(book.sheets[sheet]!);
    // On the sheet of the start first what lies ahead of it, at last what lies behind.
    const ahead = backwards
      ? { from: 0, to: Math.min(rows, after.row + 1) }
      : { from: Math.min(rows, after.row), to: rows };
    const span = isFirst ? ahead : { from: 0, to: rows };
    const found = findInSheet(book, sheet, options, accepts, span, backwards);
    if (found) return found;
  }
  return undefined;
}

function comparePlaces(a: Place, b: Place): number {
  return a.row - b.row || a.column - b.column;
}

/** Row by row from one end, a block of rows at a time. */
function findInSheet(
  book: Book,
  sheet: number,
  options: FindOptions,
  accepts: (place: Place) => boolean,
  { from, to }: Span,
  backwards: boolean,
): Place | undefined {
  const blocks = Math.ceil((to - from) / blockRows);
  for (let turn = 0; turn < blocks; turn++) {
    const top = from + (backwards ? blocks - 1 - turn : turn) * blockRows;
    const hits = hitsIn(book, sheet, options, { from: top, to: Math.min(to, top + blockRows) }).filter(accepts);
    const hit = hits.sort(comparePlaces).at(backwards ? -1 : 0);
    if (hit) return hit;
  }
  return undefined;
}

/** Columns of nothing but numbers are passed over where the text cannot stand in a number. */
function hitsIn(book: Book, sheet: number, options: FindOptions, { from, to }: Span): Place[] {
  const couldBeNumber = /^[-+.\dE]+$/i.test(options.text);
  const hits: Place[] = [];
  for (const [column, { cells, runs }] of (book.sheets[sheet]?.columns ?? []).entries()) {
    const hasFormulas = options.inFormulas && spansIn(runs, from, to).length > 0;
    const { others } = sliceCells(cells, from, Math.min(to, Math.max(from, cells.length)));
    if (
      !couldBeNumber &&
      !hasFormulas &&
      !others?.some((each) => typeof each === "string" || typeof each === "object")
    ) {
      continue;
    }
    hits.push(...findCells(book, { sheet, top: from, left: column, bottom: to - 1, right: column }, options));
  }
  return hits;
}

/** The next cell that holds an error, column by column and sheet by sheet, from the first again after the last. */
export function nextProblem(session: Session, after: Place): Place | undefined {
  const book = bookOfSession(session);
  const columns = book.sheets.flatMap(({ columns }, sheet) => columns.map((_, column) => ({ sheet, column })));
  const start = columns.findIndex(({ sheet, column }) => sheet === after.sheet && column === after.column);
  const first = nextErrorRow(session, after.sheet, after.column, after.row + 1);
  if (first !== undefined) return { ...after, row: first };
  for (let turn = 1; turn <= columns.length; turn++) {
    const at = columns[(Math.max(0, start) + turn + (start < 0 ? -1 : 0)) % columns.length]!;
    const row = nextErrorRow(session, at.sheet, at.column, 0);
    if (row !== undefined) return { ...at, row };
  }
  return undefined;
}

function nextErrorRow(session: Session, sheet: number, column: number, from: number): number | undefined {
  const { chunks, starts } = columnAt(bookOfSession(session), sheet, column).cells;
  for (const [index, chunk] of chunks.entries()) {
    const start = starts[index] as number;
    if (start + chunk.length <= from || errorsInChunk(chunk) === 0) continue;
    for (let at = Math.max(0, from - start); at < chunk.length; at++) {
      if (chunk.others?.[at] instanceof CellError && isVisible(session.filters[sheet], start + at)) return start + at;
    }
  }
  return undefined;
}
