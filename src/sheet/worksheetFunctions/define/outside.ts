import type { Cell, ErrorCode } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import { quoteCell } from "../../values/quoteCell.js";

/**
 * The error for an input that a function cannot use. `what` is "FUNCTION: input", `because` says what the value is,
 * `needed` what is needed with an example.
 */
export function outside(
  what: string,
  value: Cell,
  because: string,
  needed: string,
  code: ErrorCode = "#NUM!",
): CellError {
  return new CellError(code, `${what} is ${because}`, () => `${what} is ${quoteCell(value)}, ${because}; ${needed}`);
}
