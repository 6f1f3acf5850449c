import type { Column } from "../../call/column.js";
import { bookOf } from "../../sheet/book/bookOf.js";
import { plainWorkbookColumn, plainWorkbookSheet, type Workbook } from "../../sheet/display/workbook.js";
import type { DescribedTable } from "./describedTable.js";

/** A table as a workbook of one sheet: header, row of units where the table has one, data; the header stays in sight. */
export function workbookOfTable({ header, unitsRow, columns, name = "Table" }: DescribedTable): Workbook {
  const heads = header.map((text, index) => (unitsRow ? [text, unitsRow[index]!] : [text]));
  const sheet = { name: sheetName(name), columns: columns.map((column, index) => below(heads[index]!, column)) };
  const frozenRows = unitsRow ? 2 : 1;
  return {
    book: bookOf([sheet]),
    sheets: [
      {
        ...plainWorkbookSheet,
        frozenRows,
        columns: header.map((text) => ({ ...plainWorkbookColumn, width: widthOf(text) })),
      },
    ],
    notes: [],
  };
}

function below(heads: readonly string[], { length, numbers, others }: Column): Column {
  const all = new Float64Array(heads.length + length).fill(Number.NaN, 0, heads.length);
  all.set(numbers, heads.length);
  const texts = heads.map((text) => (text === "" ? null : text));
  return { length: all.length, numbers: all, others: [...texts, ...(others ?? new Array(length).fill(undefined))] };
}

/** ECMA-376: at most 31 characters, and none of these. */
function sheetName(name: string): string {
  return (
    name
      .replace(/[\\/?*[\]:']/g, " ")
      .trim()
      .slice(0, 31)
      .trim() || "Table"
  );
}

function widthOf(text: string): number {
  return Math.min(40, Math.max(10, text.length + 2));
}
