import type { Cell } from "../../../../call/cell.js";
import { cellAt } from "../../../../call/column.js";
import { writeHtmlTable } from "../../../../files/clipboard/writeHtmlTable.js";
import { writeTsv } from "../../../../files/clipboard/writeTsv.js";
import type { Area, Book } from "../../../../sheet/book/book.js";
import { readColumn } from "../../../../sheet/book/readColumn.js";
import type { Span } from "../../../../sheet/book/spans.js";
import { bookOfSession, type Session } from "../session.js";
import { countRows, visibleSpans } from "../view/visibleRows.js";
import { clipArea } from "./clipArea.js";

/** What was copied on this page: the book as it was then, and the rows of the area that were seen. */
export interface OwnClip {
  readonly token: string;
  readonly book: Book;
  readonly area: Area;
  readonly rows: readonly Span[];
}

/** A table for other programs takes much more room as HTML; larger copies go as plain text alone. */
const mostHtmlCells = 50_000;

/** The text has every digit; the HTML says in its attributes what cells hold and how they are calculated. */
export function copyArea(session: Session, area: Area, token: string): { clip: OwnClip; text: string; html: string } {
  const book = bookOfSession(session);
  const single = area.top === area.bottom && area.left === area.right;
  const clipped = single ? area : clipArea(book, area);
  const rows = visibleSpans(session, area.sheet, clipped.top, clipped.bottom + 1);
  const isSmall = countRows(rows) * (clipped.right - clipped.left + 1) <= mostHtmlCells;
  const html = isSmall ? writeHtmlTable(book, clipped, rows) : "";
  return { clip: { token, book, area: clipped, rows }, text: writeTsv(linesOf(book, clipped, rows)), html };
}

function linesOf(book: Book, { sheet, left, right }: Area, rows: readonly Span[]): Cell[][] {
  const lines: Cell[][] = [];
  for (const { from, to } of rows) {
    const columns = Array.from({ length: right - left + 1 }, (_, across) =>
      readColumn(book, { sheet, column: left + across, from, to }),
    );
    for (let row = 0; row < to - from; row++) lines.push(columns.map((column) => cellAt(column, row)));
  }
  return lines;
}
