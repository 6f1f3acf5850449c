import type { Column, OtherCell } from "../../call/column.js";
import type { DelimitedTable } from "../../files/delimited/delimitedTable.js";
import type { Book } from "../../sheet/book/book.js";
import { bookOf } from "../../sheet/book/bookOf.js";

/** The rows of a table's worksheet that stand above its data: the header, and the row of units where there is one. */
export function headerRows(table: DelimitedTable): number {
  return table.unitsRow === undefined ? 1 : 2;
}

/** A table as a worksheet: header in row 1, units in row 2 where the file has such a row, then the data. */
export function tableBook(table: DelimitedTable): Book {
  const columns = table.columns.map((column, index) => {
    const unit = table.unitsRow?.[index];
    return underHeader(unit === undefined ? [table.header[index]!] : [table.header[index]!, unit], column);
  });
  return bookOf([{ name: "Table", columns }]);
}

function underHeader(texts: readonly string[], data: Column): Column {
  const length = texts.length + data.length;
  const numbers = new Float64Array(length);
  numbers.fill(Number.NaN, 0, texts.length);
  numbers.set(data.numbers, texts.length);
  const others = new Array<OtherCell | undefined>(length);
  texts.forEach((text, row) => {
    others[row] = text === "" ? null : text;
  });
  for (let row = 0; row < data.length; row++) others[row + texts.length] = data.others?.[row];
  return { length, numbers, others };
}
