import type { Cell } from "../../call/cell.js";
import { addressText } from "../../sheet/book/address.js";
import type { Area, Book } from "../../sheet/book/book.js";
import { columnAt } from "../../sheet/book/book.js";
import { cellOf } from "../../sheet/book/cellOf.js";
import { formulaOf } from "../../sheet/book/formulaOf.js";
import { spanAt } from "../../sheet/book/spans.js";
import { fieldOfCell } from "../cell/fieldOfCell.js";
import { markOf, marks } from "./ownMarks.js";

/**
 * An area of a book as an HTML table: what other programs show, and in attributes what the cells hold. Cells that a
 * formula of the area fills are blank beside it: it fills them again.
 */
export function writeHtmlTable(book: Book, area: Area): string {
  const { sheet, top, left, bottom, right } = area;
  let rows = "";
  for (let row = top; row <= bottom; row++) {
    rows += "<tr>";
    for (let column = left; column <= right; column++) {
      const place = { sheet, row, column };
      rows += cellElement(cellOf(book, place), formulaOf(book, place), isFilledFromWithin(book, area, row, column));
    }
    rows += "</tr>";
  }
  return `<table ${marks.origin}="${addressText(top, left)}"><tbody>${rows}</tbody></table>`;
}

function isFilledFromWithin(book: Book, area: Area, row: number, column: number): boolean {
  const claim = spanAt(columnAt(book, area.sheet, column).claims, row);
  const from = claim?.row ?? row;
  return claim !== undefined && claim.column >= area.left && claim.column <= area.right && from >= area.top;
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
