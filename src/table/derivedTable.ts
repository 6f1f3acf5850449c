import { cellAt } from "../call/column.js";
import type { ComparedColumn, ComparedTable } from "./compareTables.js";
import { headerText } from "./headerText.js";
import { recogniseColumn } from "./recogniseColumn.js";
import { nameColumn, nameOf } from "./rowNames.js";
import type { PlannedColumn, TablePlan } from "./tableOf.js";

/** The columns of a table that formulas work out, with what names each row; `rowName` names those without a name. */
export function derivedTable(
  plan: Pick<TablePlan, "columns" | "rows">,
  isDerived: (column: PlannedColumn) => boolean,
  rowName: (row: number) => string,
): ComparedTable {
  const derived = plan.columns.filter(isDerived);
  const columns = derived.filter((column) => !isUncertainty(column)).map(compared);
  return { keys: keysOf(plan, derived, rowName), columns };

  function compared(column: PlannedColumn): ComparedColumn {
    const beside = plan.columns.find(({ index }) => index === column.index + 1);
    const sigma = beside && isUncertainty(beside) ? { sigma: beside.column } : {};
    return { header: headerText(column), column: column.column, ...sigma };
  }
}

function isUncertainty({ header, unitCell }: PlannedColumn): boolean {
  return recogniseColumn(header, unitCell).isUncertainty;
}

/** The first column of texts names the rows. */
function keysOf(
  { columns, rows }: Pick<TablePlan, "columns" | "rows">,
  derived: readonly PlannedColumn[],
  rowName: (row: number) => string,
): readonly string[] {
  const typed = columns.filter((column) => !derived.includes(column));
  const names = nameColumn(typed, rows);
  return Array.from({ length: rows }, (_, row) => {
    const name = names ? nameOf(cellAt(names.column, row)) : "";
    return name === "" ? rowName(row) : name;
  });
}
