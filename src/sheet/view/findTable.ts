import type { Cell } from "../../call/cell.js";
import { cellAt } from "../../call/column.js";
import { type TablePlan, tableOf } from "../../table/tableOf.js";
import type { Book } from "../book/book.js";
import { readColumn } from "../book/readColumn.js";
import { columnsInUse, usedRows } from "../book/usedRows.js";

/** So many rows decide where the headers of a sheet stand. */
const nearRows = 40;

/** Where the table of a sheet lies; its columns hold the first rows only. Undefined where no row looks like headers. */
export function findTable(book: Book, sheet: number): TablePlan | undefined {
  return tableOf(nearCells(book, sheet));
}

/** The first rows of a sheet, over all columns in use. */
export function nearCells(book: Book, sheet: number): Cell[][] {
  const rows = Math.min(nearRows, usedRows(book, sheet));
  const columns = Array.from({ length: columnsInUse(book.sheets[sheet]) }, (_, column) =>
    readColumn(book, { sheet, column, from: 0, to: rows }),
  );
  return Array.from({ length: rows }, (_, row) => columns.map((column) => cellAt(column, row)));
}
