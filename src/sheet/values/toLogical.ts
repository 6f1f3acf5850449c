import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import { quoteCell } from "./quoteCell.js";

/** A cell as a logical (ISO/IEC 26300-3 section 6.3.12): blank and 0 are FALSE, other numbers TRUE, the words themselves. */
export function toLogical(cell: Cell, what: string): boolean | CellError {
  if (typeof cell === "boolean" || cell instanceof CellError) {
    return cell;
  }
  if (typeof cell === "number") {
    return cell !== 0;
  }
  if (cell === null) {
    return false;
  }
  const word = cell.trim().toUpperCase();
  if (word === "TRUE" || word === "FALSE") {
    return word === "TRUE";
  }
  return new CellError(
    "#VALUE!",
    `${what} is a text where TRUE or FALSE is needed`,
    () => `${what} is ${quoteCell(cell)}, a text; TRUE, FALSE or a number is needed, for example TRUE`,
  );
}
