import { CellError } from "../../../../call/cell.js";
import type { Book, Place } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { formulaOf } from "../../../../sheet/book/formulaOf.js";
import { entryOf } from "../../../../sheet/edit/entryOf.js";
import { textFromNumber } from "../../../../sheet/values/textFromNumber.js";

/** What a cell holds as one would type it: the formula, the full double, a text so that it stays a text. */
export function entryText(book: Book, place: Place): string {
  const formula = formulaOf(book, place);
  if (formula !== undefined) return formula;
  const cell = cellOf(book, place);
  if (cell === null) return "";
  if (typeof cell === "number") return Object.is(cell, -0) ? "-0" : textFromNumber(cell);
  if (typeof cell === "boolean") return cell ? "TRUE" : "FALSE";
  if (cell instanceof CellError) return cell.code;
  return entryOf(cell) === cell ? cell : `'${cell}`;
}
