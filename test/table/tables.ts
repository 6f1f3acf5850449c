import type { Cell } from "../../src/call/cell.js";
import type { ColumnCheck } from "../../src/table/checkColumn.js";
import { checkTable } from "../../src/table/checkTable.js";
import { sentenceOfColumnFinding } from "../../src/table/columnFinding.js";
import { tableOf } from "../../src/table/tableOf.js";

/** The checks of a table written as rows of cells. */
export function checksOf(rows: readonly (readonly Cell[])[]): readonly ColumnCheck[] {
  const plan = tableOf(rows);
  if (!plan) throw new Error("no table was found");
  return checkTable(plan.columns);
}

/** What is said of a table, column after column; rows of data count from 1. */
export function sentencesOf(rows: readonly (readonly Cell[])[]): readonly string[] {
  return checksOf(rows).flatMap(({ header, findings }) =>
    findings.map((finding) => sentenceOfColumnFinding(finding, header, (row) => `row ${row + 1}`)),
  );
}
