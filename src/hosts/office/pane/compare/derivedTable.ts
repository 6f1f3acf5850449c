import type { ComparedTable } from "../../../../table/compareTables.js";
import { derivedTable as derivedColumns } from "../../../../table/derivedTable.js";
import type { SheetTable } from "../sheetTable.js";

/** The columns of a table that formulas work out, with what names each row. */
export function derivedTable({ plan, used }: SheetTable): ComparedTable {
  return derivedColumns(
    plan,
    ({ index }) => used.formulas.slice(plan.firstRow).some((row) => row[index] !== undefined),
    (row) => `row ${used.area.row + plan.firstRow + row + 1}`,
  );
}
