import { CellError } from "../../call/cell.js";
import { quoteCell } from "./quoteCell.js";

/**
 * `base` to the power `exponent` (ISO/IEC 26300-3 sections 6.4.6 and 6.16.46). The standard leaves 0^0 open between
 * 0, 1 and an error; it is an error here, because a cell that was meant to hold a base would go unnoticed.
 */
export function power(base: number, exponent: number, what: string): number | CellError {
  if (base === 0 && exponent < 0) {
    return new CellError(
      "#DIV/0!",
      `${what}: zero to a negative power`,
      () => `${what}: base is 0, exponent ${quoteCell(exponent)}; a base other than 0 is needed`,
    );
  }
  const value = base ** exponent;
  if (base === 0 && exponent === 0) {
    return new CellError(
      "#NUM!",
      `${what}: zero to the power zero`,
      `${what}: base and exponent are both 0 or blank, which has no agreed value; a base other than 0 is needed`,
    );
  }
  if (Number.isNaN(value)) {
    return new CellError(
      "#NUM!",
      `${what}: a negative base with a fractional exponent`,
      () =>
        `${what}: base is ${quoteCell(base)}, exponent ${quoteCell(exponent)}; a base of 0 or more is needed, or a whole exponent, for example 2`,
    );
  }
  if (!Number.isFinite(value)) {
    return new CellError(
      "#NUM!",
      `${what}: the result is too large`,
      () =>
        `${what}: ${quoteCell(base)} ^ ${quoteCell(exponent)} is beyond 1.79E+308, the largest double; smaller numbers are needed`,
    );
  }
  return value;
}
