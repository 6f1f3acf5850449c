import type { Cell } from "../call/cell.js";
import type { Comparison } from "./compareTables.js";

/** A comparison as the cells of a sheet, the numbers in full. */
export function comparisonSheet({ movements }: Comparison): readonly (readonly Cell[])[] {
  const head = ["Row", "Column", "Before", "After", "Change", "Change [%]", "Change in sigma"];
  return [
    head,
    ...movements.map(({ key, header, before, after, change, relative, sigmas }): Cell[] => [
      key,
      header,
      before,
      after,
      change ?? null,
      relative === undefined ? null : 100 * relative,
      sigmas ?? null,
    ]),
  ];
}
