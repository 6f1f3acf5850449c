import type { Column } from "../../call/column.js";
import type { Book } from "./book.js";
import { emptyColumn } from "./book.js";
import { cellsOfChunks, chunksOf } from "./cells.js";

/** A book of values. Headers are the first rows of their columns. The numbers are shared: they must not change. */
export function bookOf(sheets: readonly { readonly name: string; readonly columns: readonly Column[] }[]): Book {
  return {
    names: [],
    sheets: sheets.map(({ name, columns }) => ({
      name,
      columns: columns.map((column) => ({ ...emptyColumn, cells: cellsOfChunks(chunksOf(column)) })),
    })),
  };
}
