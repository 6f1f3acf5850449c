import type { Cell } from "../../call/cell.js";
import type { Book, Place } from "./book.js";
import { columnAt } from "./book.js";
import { readCell } from "./cells.js";

/** What a cell holds: what was typed, or what its formula gave. */
export function cellOf(book: Book, { sheet, row, column }: Place): Cell {
  return readCell(columnAt(book, sheet, column).cells, row);
}
