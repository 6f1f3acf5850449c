import { cellAt } from "../../../../call/column.js";
import type { ComparedColumn, ComparedTable } from "../../../../table/compareTables.js";
import { headerText } from "../../../../table/headerText.js";
import { recogniseColumn } from "../../../../table/recogniseColumn.js";
import { nameColumn, rowName } from "../../../../table/rowNames.js";
import type { PlannedColumn } from "../../../../table/tableOf.js";
import type { SheetTable } from "../sheetTable.js";

/** The columns of a table that formulas work out, with what names each row. */
export function derivedTable(table: SheetTable): ComparedTable {
  const { plan } = table;
  const derived = plan.columns.filter((column) => hasFormula(table, column));
  return { keys: keysOf(table, derived), columns: derived.filter((column) => !isUncertainty(column)).map(compared) };

  function compared(column: PlannedColumn): ComparedColumn {
    const beside = plan.columns.find(({ index }) => index === column.index + 1);
    const sigma = beside && isUncertainty(beside) ? { sigma: beside.column } : {};
    return { header: headerText(column), column: column.column, ...sigma };
  }
}

function isUncertainty({ header, unitCell }: PlannedColumn): boolean {
  return recogniseColumn(header, unitCell).isUncertainty;
}

function hasFormula({ used, plan }: SheetTable, { index }: PlannedColumn): boolean {
  return used.formulas.slice(plan.firstRow).some((row) => row[index] !== undefined);
}

/** The first column of texts names the rows; where there is none, their numbers do. */
function keysOf({ plan, used }: SheetTable, derived: readonly PlannedColumn[]): readonly string[] {
  const typed = plan.columns.filter((column) => !derived.includes(column));
  const names = nameColumn(typed, plan.rows);
  return Array.from({ length: plan.rows }, (_, row) =>
    rowName(names ? cellAt(names.column, row) : null, used.area.row + plan.firstRow + row + 1),
  );
}
