import type { Cell } from "../../call/cell.js";
import { addressText } from "../../sheet/book/address.js";
import type { Area, Book } from "../../sheet/book/book.js";
import { columnAt } from "../../sheet/book/book.js";
import { readCell } from "../../sheet/book/cells.js";
import type { Span } from "../../sheet/book/spans.js";
import { spanAt } from "../../sheet/book/spans.js";
import { formulaText } from "../../sheet/formula/formula.js";
import { fieldOfCell } from "../cell/fieldOfCell.js";
import { markOf, marks } from "./ownMarks.js";

/**
 * An area of a book as an HTML table: what other programs show, and in attributes what the cells hold. Cells that a
 * formula of the area fills are blank beside it: it fills them again. Of all `rows` where only some of the area are
 * copied, they stand close below each other, and their formulas are those of where they stand.
 */
export function writeHtmlTable(book: Book, area: Area, rows: readonly Span[] = wholeOf(area)): string {
  const { sheet, top, left, right } = area;
  const columns = Array.from({ length: right - left + 1 }, (_, across) => columnAt(book, sheet, left + across));
  let text = "";
  let down = 0;
  for (const { from, to } of rows) {
    for (let row = from; row < to; row++, down++) {
      text += "<tr>";
      for (const [across, { cells, runs }] of columns.entries()) {
        const run = spanAt(runs, row);
        const formula = run && formulaText(run.formula, top + down, left + across);
        text += cellElement(readCell(cells, row), formula, isFilledFromWithin(book, area, rows, row, left + across));
      }
      text += "</tr>";
    }
  }
  return `<table ${marks.origin}="${addressText(top, left)}"><tbody>${text}</tbody></table>`;
}

function wholeOf({ top, bottom }: Area): readonly Span[] {
  return [{ from: top, to: bottom + 1 }];
}

function isFilledFromWithin(book: Book, area: Area, rows: readonly Span[], row: number, column: number): boolean {
  const claim = spanAt(columnAt(book, area.sheet, column).claims, row);
  if (claim === undefined || claim.column < area.left || claim.column > area.right) return false;
  return spanAt(rows, claim.row ?? row) !== undefined;
}

function cellElement(cell: Cell, formula: string | undefined, isFilled: boolean): string {
  const [kind, value] = isFilled ? markOf(null) : markOf(cell);
  const own = formula === undefined ? "" : ` ${marks.formula}="${escapeHtml(formula)}"`;
  const text = escapeHtml(fieldOfCell(cell)).replace(/\r\n?|\n/g, "<br>");
  // Other programs would take a text such as 007 for a number; this keeps most of them from it.
  const style = typeof cell === "string" ? ` style="white-space:pre-wrap;mso-number-format:'\\@'"` : "";
  return `<td ${marks.kind}="${kind}" ${marks.value}="${escapeHtml(value)}"${own}${style}>${text}</td>`;
}

function escapeHtml(text: string): string {
  return text
    .replaceAll("&", "&amp;")
    .replaceAll("<", "&lt;")
    .replaceAll(">", "&gt;")
    .replaceAll('"', "&quot;")
    .replaceAll("\r", "&#13;");
}
