import { CellError } from "../call/cell.js";
import type { Movement } from "./compareTables.js";

/** What happened to a cell that is no number before and after. */
export function kindOfChange({ rowBefore, rowAfter, before, after }: Movement): string {
  if (rowBefore === undefined) return "a new row";
  if (rowAfter === undefined) return "the row is gone";
  if (after instanceof CellError) return before instanceof CellError ? "another error" : "became an error";
  if (before instanceof CellError) return "no longer an error";
  if (before === null) return "was blank";
  return after === null ? "became blank" : "another text";
}
