import type { Cell } from "../call/cell.js";
import type { Change } from "./changeOf.js";

/** One cell that moved, as it is listed. */
export interface ListedChange extends Change {
  readonly key: string;
  readonly header: string;
  readonly before: Cell;
  readonly after: Cell;
}

/** The headers over cells that list changes. */
export const changeHeaders: readonly string[] = [
  "Row",
  "Column",
  "Before",
  "After",
  "Change",
  "Change [%]",
  "Change in sigma",
];

/** A change as the cells of a row, the numbers in full. */
export function changeCells({ key, header, before, after, change, relative, sigmas }: ListedChange): Cell[] {
  return [key, header, before, after, change ?? null, relative === undefined ? null : 100 * relative, sigmas ?? null];
}
