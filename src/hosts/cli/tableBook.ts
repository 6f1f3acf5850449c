import { columnOf } from "../../call/column.js";
import type { TableFile } from "../../files/table/tableFile.js";
import type { Book } from "../../sheet/book/book.js";
import { bookOf } from "../../sheet/book/bookOf.js";
import { change } from "../../sheet/change.js";
import { setColumn } from "../../sheet/edit/setColumn.js";
import { functions } from "./worksheet.js";

/** What of a table its worksheet shows. */
export type SheetTable = Pick<TableFile, "header" | "unitsRow" | "columns" | "rows">;

/** The rows of a table's worksheet that stand above its data: the header, and the row of units where there is one. */
export function headerRows(table: SheetTable): number {
  return table.unitsRow === undefined ? 1 : 2;
}

/** A table as a worksheet: header in row 1, units in row 2 where the file has such a row, then the data. */
export function tableBook(table: SheetTable): Book {
  const headers = table.header.map((header, index) => {
    const texts = table.unitsRow ? [header, table.unitsRow[index]!] : [header];
    return columnOf(texts.map((text) => (text === "" ? null : text)));
  });
  const row = headerRows(table);
  const data = table.columns.map((column, index) => setColumn({ sheet: 0, row, column: index }, column));
  return change(bookOf([{ name: "Table", columns: headers }]), table.rows === 0 ? [] : data, functions);
}
