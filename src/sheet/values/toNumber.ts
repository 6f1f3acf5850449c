import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import { numberFromText } from "./numberFromText.js";
import { quoteCell } from "./quoteCell.js";

/**
 * A cell as a number (ISO/IEC 26300-3 section 6.3.5): blank is 0, TRUE 1, FALSE 0, a text the number that it is.
 * `what` names the operator or function and its input, for the message: "ROUND: digits".
 */
export function toNumber(cell: Cell, what: string): number | CellError {
  if (typeof cell === "number") {
    return cell;
  }
  if (cell === null) {
    return 0;
  }
  if (typeof cell === "boolean") {
    return cell ? 1 : 0;
  }
  if (cell instanceof CellError) {
    return cell;
  }
  return numberFromText(cell) ?? notANumber(cell, what);
}

function notANumber(text: string, what: string): CellError {
  return new CellError(
    "#VALUE!",
    `${what} is a text where a number is needed`,
    () => `${what} is ${quoteCell(text)}, a text that is no number; a number is needed, for example 4.2`,
  );
}
