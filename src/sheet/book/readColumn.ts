import type { Column } from "../../call/column.js";
import type { Book, ColumnSpan } from "./book.js";
import { columnAt } from "./book.js";
import { sliceCells } from "./cells.js";

/** The cells of a span. The numbers may be shared with the book: they are to be read only. */
export function readColumn(book: Book, { sheet, column, from, to }: ColumnSpan): Column {
  return sliceCells(columnAt(book, sheet, column).cells, from, to);
}
