import type { Cell } from "../../call/cell.js";
import type { Column } from "../../call/column.js";
import type { Formula } from "../formula/formula.js";

/** What a formula can see: the cells of a book as they stand. */
export interface World {
  read(sheet: number, row: number, column: number): Cell;
  slice(sheet: number, column: number, from: number, to: number): Column;
  /** The number of rows down to the last one of a column that is not blank. */
  usedRows(sheet: number, column: number): number;
  usedColumns(sheet: number): number;
  /** -1 where no sheet has the name. */
  sheetIndex(name: string): number;
  sheetNames(): readonly string[];
  /** The size of what the formula in a cell filled, where it filled more than its own cell. */
  spillAt(sheet: number, row: number, column: number): { readonly rows: number; readonly width: number } | undefined;
  definedName(name: string): Formula | undefined;
  definedNames(): readonly string[];
}
