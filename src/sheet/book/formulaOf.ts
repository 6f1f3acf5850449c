import { formulaText } from "../formula/formula.js";
import type { Book, Place } from "./book.js";
import { columnAt } from "./book.js";
import { spanAt } from "./spans.js";

/** The formula of a cell, as typed there; undefined where the cell holds a value or was filled by another formula. */
export function formulaOf(book: Book, { sheet, row, column }: Place): string | undefined {
  const run = spanAt(columnAt(book, sheet, column).runs, row);
  return run && formulaText(run.formula, row, column);
}
