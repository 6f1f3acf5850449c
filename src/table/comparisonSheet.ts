import type { Cell } from "../call/cell.js";
import { changeCells, changeHeaders } from "./changeCells.js";
import type { Comparison } from "./compareTables.js";

/** A comparison as the cells of a sheet, the numbers in full. */
export function comparisonSheet({ movements }: Comparison): readonly (readonly Cell[])[] {
  return [changeHeaders, ...movements.map(changeCells)];
}
