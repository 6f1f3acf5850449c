import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import { compareCells } from "./compareCells.js";
import { power } from "./power.js";
import { quoteCell } from "./quoteCell.js";
import { toNumber } from "./toNumber.js";
import { toText } from "./toText.js";

export type Operator = "+" | "-" | "*" | "/" | "^" | "&" | "=" | "<>" | "<" | "<=" | ">" | ">=";

/** One operator between two cells (ISO/IEC 26300-3 section 6.4). An error on the left goes before one on the right. */
export function operate(operator: Operator, left: Cell, right: Cell): Cell {
  if (left instanceof CellError) {
    return left;
  }
  if (right instanceof CellError) {
    return right;
  }
  switch (operator) {
    case "&":
      return `${toText(left)}${toText(right)}`;
    case "=":
      return compareCells(left, right) === 0;
    case "<>":
      return compareCells(left, right) !== 0;
    case "<":
      return compareCells(left, right) < 0;
    case "<=":
      return compareCells(left, right) <= 0;
    case ">":
      return compareCells(left, right) > 0;
    case ">=":
      return compareCells(left, right) >= 0;
    default:
      return arithmetic(operator, left, right);
  }
}

/** Section 6.4.16. */
export function negate(cell: Cell): Cell {
  const value = toNumber(cell, '"-": what follows');
  return typeof value === "number" ? -value : value;
}

/** Section 6.4.14. */
export function percent(cell: Cell): Cell {
  const value = toNumber(cell, '"%": what stands before');
  return typeof value === "number" ? value / 100 : value;
}

function arithmetic(operator: "+" | "-" | "*" | "/" | "^", left: Cell, right: Cell): Cell {
  const a = typeof left === "number" ? left : toNumber(left, `"${operator}": left side`);
  if (typeof a !== "number") {
    return a;
  }
  const b = typeof right === "number" ? right : toNumber(right, `"${operator}": right side`);
  if (typeof b !== "number") {
    return b;
  }
  if (operator === "^") {
    return power(a, b, '"^"');
  }
  if (operator === "/" && b === 0) {
    return divisionByZero(left, right);
  }
  const value = operator === "+" ? a + b : operator === "-" ? a - b : operator === "*" ? a * b : a / b;
  return Number.isFinite(value) ? value : tooLarge(operator, a, b);
}

function divisionByZero(left: Cell, right: Cell): CellError {
  return new CellError(
    "#DIV/0!",
    '"/": right side is 0 or blank',
    () =>
      `"/": right side of ${quoteCell(left)} / ${quoteCell(right)} is zero or blank; a number other than 0 is needed`,
  );
}

function tooLarge(operator: string, left: number, right: number): CellError {
  return new CellError(
    "#NUM!",
    `"${operator}": the result is too large`,
    () =>
      `"${operator}": ${quoteCell(left)} ${operator} ${quoteCell(right)} is beyond 1.79E+308, the largest double; smaller numbers are needed`,
  );
}
