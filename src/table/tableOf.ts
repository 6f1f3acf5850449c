import type { Cell } from "../call/cell.js";
import { columnOf } from "../call/column.js";
import { isProblem } from "../units/problem.js";
import { readQuantity } from "../units/readQuantity.js";
import { readUnit } from "../units/readUnit.js";
import type { TableColumn } from "./checkTable.js";

/** Where the parts of a table lie in a rectangle of cells; rows and columns count from its first cell. */
export interface TablePlan {
  readonly headerRow: number;
  /** A row under the headers that holds nothing but units. */
  readonly unitRow: number | undefined;
  readonly firstRow: number;
  /** Rows of data; blank rows at the end do not count. */
  readonly rows: number;
  readonly columns: readonly PlannedColumn[];
}

/** One column with a header; `index` is its place in the rectangle. */
export interface PlannedColumn extends TableColumn {
  readonly index: number;
}

/** Titles and remarks may stand above the headers, but not more than this many rows of them. */
const mostRowsAbove = 20;

/** Finds the table in a rectangle of cells; undefined where no row looks like headers. */
export function tableOf(cells: readonly (readonly Cell[])[]): TablePlan | undefined {
  const headerRow = headerRowOf(cells);
  if (headerRow === undefined) return undefined;
  const unitRow = isUnitRow(cells[headerRow + 1] ?? []) ? headerRow + 1 : undefined;
  const firstRow = (unitRow ?? headerRow) + 1;
  const last = cells.findLastIndex((row) => row.some((cell) => !isBlank(cell)));
  const rows = Math.max(0, last - firstRow + 1);
  const columns = cells[headerRow]!.flatMap((header, index): PlannedColumn[] => {
    if (isBlank(header)) return [];
    const unit = unitRow === undefined ? null : cells[unitRow]![index]!;
    const states = !isBlank(unit) && unit !== "-";
    const column = columnOf(cells.slice(firstRow, firstRow + rows).map((row) => row[index]!));
    return [{ index, header: String(header), ...(states ? { unitCell: String(unit) } : {}), column }];
  });
  return { headerRow, unitRow, firstRow, rows, columns };
}

/** The first row of nothing but names that is at least half as wide as the widest row near it. */
function headerRowOf(cells: readonly (readonly Cell[])[]): number | undefined {
  const near = cells.slice(0, mostRowsAbove + 2);
  const widest = Math.max(0, ...near.map((row) => filled(row).length));
  const found = near.slice(0, mostRowsAbove + 1).findIndex((row) => {
    const names = filled(row);
    return names.length > 0 && 2 * names.length >= widest && names.every(isName);
  });
  return found < 0 ? undefined : found;
}

function isName(cell: Cell): boolean {
  return typeof cell === "string" && isProblem(readQuantity(cell));
}

/** Symbols such as `K` and `e` read as units too, so that a row of units is one that follows the headers. */
function isUnitRow(row: readonly Cell[]): boolean {
  const units = filled(row);
  return units.length > 0 && units.every((cell) => typeof cell === "string" && (cell === "-" || isUnit(cell)));
}

function isUnit(text: string): boolean {
  const unit = readUnit(text);
  return !isProblem(unit) || unit.problem === "ambiguous unit";
}

function filled(row: readonly Cell[]): readonly Cell[] {
  return row.filter((cell) => !isBlank(cell));
}

function isBlank(cell: Cell | undefined): boolean {
  return cell === null || cell === undefined || (typeof cell === "string" && cell.trim() === "");
}
