import type { Cell } from "../../call/cell.js";
import type { Column, OtherCell } from "../../call/column.js";

/** Functions whose finite results on numbers are those of the machine; a test holds them against the functions themselves. */
const functions: Readonly<Record<string, (x: number) => number>> = {
  ABS: Math.abs,
  ACOS: Math.acos,
  ASIN: Math.asin,
  ASINH: Math.asinh,
  ATAN: Math.atan,
  COS: Math.cos,
  COSH: Math.cosh,
  EXP: Math.exp,
  LN: Math.log,
  LOG10: Math.log10,
  SIN: Math.sin,
  SINH: Math.sinh,
  SQRT: Math.sqrt,
  TAN: Math.tan,
  TANH: Math.tanh,
};

/**
 * A function of one number over a column: what is no number or has no finite result goes through `slow`.
 * Undefined for any other function.
 */
export function mathOverColumn(name: string, column: Column): ((slow: (row: number) => Cell) => Column) | undefined {
  const compute = functions[name];
  return compute === undefined ? undefined : (slow) => apply(compute, column, slow);
}

function apply(compute: (x: number) => number, column: Column, slow: (row: number) => Cell): Column {
  const numbers = new Float64Array(column.length);
  let others: (OtherCell | undefined)[] | undefined;
  for (let row = 0; row < column.length; row++) {
    const value = compute(column.numbers[row] as number);
    if (Number.isFinite(value)) {
      numbers[row] = value;
      continue;
    }
    const cell = slow(row);
    if (typeof cell === "number") {
      numbers[row] = cell;
    } else {
      numbers[row] = Number.NaN;
      others ??= new Array(column.length).fill(undefined);
      others[row] = cell;
    }
  }
  return { length: column.length, numbers, others };
}
