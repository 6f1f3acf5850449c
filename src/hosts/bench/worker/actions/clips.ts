import { cellAt } from "../../../../call/column.js";
import { fieldOfCell } from "../../../../files/cell/fieldOfCell.js";
import type { Area, Book } from "../../../../sheet/book/book.js";
import { readColumn } from "../../../../sheet/book/readColumn.js";
import type { Span } from "../../../../sheet/book/spans.js";
import { bookOfSession, type Session } from "../session.js";
import { visibleSpans } from "../view/visibleRows.js";
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

export function copyArea(session: Session, area: Area, token: string): { clip: OwnClip; text: string; html: string } {
  const book = bookOfSession(session);
  const single = area.top === area.bottom && area.left === area.right;
  const clipped = single ? area : clipArea(book, area);
  const rows = visibleSpans(session, area.sheet, clipped.top, clipped.bottom + 1);
  const lines = linesOf(book, clipped, rows);
  const text = lines.map((line) => line.map(tabbedField).join("\t")).join("\n");
  const html = lines.length * (lines[0]?.length ?? 0) > mostHtmlCells ? "" : htmlTable(lines);
  return { clip: { token, book, area: clipped, rows }, text, html };
}

function linesOf(book: Book, { sheet, left, right }: Area, rows: readonly Span[]): string[][] {
  const lines: string[][] = [];
  for (const { from, to } of rows) {
    const columns = Array.from({ length: right - left + 1 }, (_, across) =>
      readColumn(book, { sheet, column: left + across, from, to }),
    );
    for (let row = 0; row < to - from; row++) lines.push(columns.map((column) => fieldOfCell(cellAt(column, row))));
  }
  return lines;
}

function tabbedField(text: string): string {
  return /[\t\n\r]|^"/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

const entities: Readonly<Record<string, string>> = { "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;" };

function htmlTable(lines: readonly (readonly string[])[]): string {
  const cell = (text: string) => `<td>${text.replace(/[&<>"]/g, (each) => entities[each] as string)}</td>`;
  return `<table>${lines.map((line) => `<tr>${line.map(cell).join("")}</tr>`).join("")}</table>`;
}
