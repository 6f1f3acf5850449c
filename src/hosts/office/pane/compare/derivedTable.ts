import { type Cell, CellError } from "../../../../call/cell.js";
import { cellAt } from "../../../../call/column.js";
import type { ComparedColumn, ComparedTable } from "../../../../table/compareTables.js";
import { recogniseColumn } from "../../../../table/recogniseColumn.js";
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

/** The header as a column of one row of headers would have it. */
function headerText({ header, unitCell }: PlannedColumn): string {
  return unitCell === undefined ? header : `${header} [${unitCell}]`;
}

function isUncertainty({ header, unitCell }: PlannedColumn): boolean {
  return recogniseColumn(header, unitCell).isUncertainty;
}

function hasFormula({ used, plan }: SheetTable, { index }: PlannedColumn): boolean {
  return used.formulas.slice(plan.firstRow).some((row) => row[index] !== undefined);
}

/** The first column of texts names the rows; where there is none, their numbers do. */
function keysOf({ plan, used }: SheetTable, derived: readonly PlannedColumn[]): readonly string[] {
  const names = plan.columns.find((column) => !derived.includes(column) && isMostlyText(column, plan.rows));
  const number = (row: number) => `row ${used.area.row + plan.firstRow + row + 1}`;
  return Array.from({ length: plan.rows }, (_, row) => {
    const name = names ? textOf(cellAt(names.column, row)) : "";
    return name === "" ? number(row) : name;
  });
}

function isMostlyText({ column }: PlannedColumn, rows: number): boolean {
  const texts = (column.others ?? []).filter((cell) => typeof cell === "string" && cell.trim() !== "");
  return 2 * texts.length > rows;
}

function textOf(cell: Cell): string {
  return cell === null ? "" : cell instanceof CellError ? cell.code : String(cell).trim();
}
