import { type BookColumn, type BookTable, bookTable, namesOfRows } from "../../../../revision/bookTable.js";
import type { LedgerEntry } from "../../../../revision/ledgerEntry.js";
import { readAddress } from "../../../../sheet/book/address.js";
import type { Book, Place } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { columnKey } from "../../../../table/columnKey.js";
import { nameOf, rowName } from "../../../../table/rowNames.js";
import { readHeader } from "../../../../units/readHeader.js";

export type FindPlace = (entry: Pick<LedgerEntry, "key" | "header" | "cell">) => Place | undefined;

/** Where the cells of a ledger stand in a book: where they stood, or else where their row and column are now. */
export function placesOf(book: Book, sheetName: string): FindPlace {
  const sheet = book.sheets.findIndex(({ name }) => name === sheetName);
  const table = sheet < 0 ? undefined : bookTable(book, sheet);
  if (!table) return () => undefined;
  const columns = new Map(table.columns.map((column) => [nameOfHeader(column.header), column]));
  let rows: Map<string, number> | undefined;
  return ({ key, header, cell }) => {
    const column = columns.get(nameOfHeader(header));
    if (!column) return undefined;
    const stood = cell === null ? undefined : readAddress(cell);
    if (stood?.column === column.column && isNamed(table, stood.row, key)) {
      return { sheet, row: stood.row, column: column.column };
    }
    rows ??= rowsByName(table);
    const row = rows.get(key);
    return row === undefined ? undefined : { sheet, row, column: column.column };
  };
}

/** Any typed cell of a row may be what names it. */
function isNamed({ book, sheet, columns, firstRow }: BookTable, row: number, key: string): boolean {
  if (row < firstRow) return false;
  const names = ({ column, isDerived }: BookColumn) =>
    !isDerived && nameOf(cellOf(book, { sheet, row, column })) === key;
  return rowName(null, row + 1) === key || columns.some(names);
}

function rowsByName(table: BookTable): Map<string, number> {
  const name = namesOfRows(table);
  const rows = new Map<string, number>();
  for (let row = table.rows - 1; row >= 0; row--) rows.set(name(row), table.firstRow + row);
  return rows;
}

function nameOfHeader(header: string): string {
  return columnKey(readHeader(header).name || header);
}
