import { type PlannedColumn, type TablePlan, tableOf } from "../../../table/tableOf.js";
import type { Area, AreaCells, Worksheet } from "./worksheet.js";

/** The table of a sheet as it was read at one moment. */
export interface SheetTable {
  /** The cells in use; the plan counts from their first cell. */
  readonly used: AreaCells;
  readonly plan: TablePlan;
}

/** Of the sheet that is seen, unless one is named; undefined where it holds no table. */
export async function readSheetTable(worksheet: Worksheet, sheet?: string): Promise<SheetTable | undefined> {
  const area = await worksheet.usedArea(sheet);
  const [used] = area ? await worksheet.read([area]) : [];
  const plan = used && tableOf(used.values);
  return used && plan ? { used, plan } : undefined;
}

/** The rows of data, over all columns in use. */
export function dataArea({ used: { area }, plan }: SheetTable): Area {
  return { ...area, row: area.row + plan.firstRow, rows: plan.rows };
}

export function isInRows(table: SheetTable | undefined, area: Area): boolean {
  if (!table) return false;
  const data = dataArea(table);
  return area.sheet === data.sheet && area.row >= data.row && area.row < data.row + data.rows;
}

/** The cell of a column that states its unit: that of the row of units, where its header states none. */
export function headerArea(table: SheetTable, column: PlannedColumn): Area {
  const { area } = table.used;
  const row = column.unitCell === undefined ? table.plan.headerRow : table.plan.unitRow!;
  return { sheet: area.sheet, row: area.row + row, column: area.column + column.index, rows: 1, columns: 1 };
}

export function columnAt(table: SheetTable, column: number): PlannedColumn | undefined {
  return table.plan.columns.find(({ index }) => index === column - table.used.area.column);
}

/** The cell of a column in one row of the data. */
export function dataCell(table: SheetTable, column: PlannedColumn, row: number): Area {
  const data = dataArea(table);
  return { sheet: data.sheet, row: data.row + row, column: data.column + column.index, rows: 1, columns: 1 };
}

/** The first column to the right of all that is in use. */
export function freeColumn({ used: { area } }: SheetTable): number {
  return area.column + area.columns;
}
