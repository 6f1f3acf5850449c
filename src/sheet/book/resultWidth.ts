import type { Book, ColumnSpan } from "./book.js";
import { columnAt } from "./book.js";
import { spansIn } from "./spans.js";

/** The columns that the widest result in a span takes: 1, or more where results spill to the right. */
export function resultWidth(book: Book, { sheet, column, from, to }: ColumnSpan): number {
  const spills = spansIn(columnAt(book, sheet, column).spills, from, to);
  return spills.reduce((most, { width, blocked }) => (blocked ? most : Math.max(most, width)), 1);
}
