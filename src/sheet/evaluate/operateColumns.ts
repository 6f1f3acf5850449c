import type { Cell } from "../../call/cell.js";
import type { Column, OtherCell } from "../../call/column.js";
import { cellAt } from "../../call/column.js";
import type { Operator } from "../values/operate.js";
import { operate } from "../values/operate.js";

/** One side of an operator over many rows: a column, or the same cell in every row. */
export type Side = Column | { readonly same: Cell };

export function sideAt(side: Side, row: number): Cell {
  return "same" in side ? side.same : cellAt(side, row);
}

/** An operator over many rows. Numbers go through arrays; every cell that is none goes through `operate`. */
export function operateColumns(operator: Operator, left: Side, right: Side, rows: number): Column {
  switch (operator) {
    case "+":
    case "-":
    case "*":
    case "/":
    case "^":
      return arithmetic(operator, left, right, rows);
    case "&":
      return cellByCell(rows, (row) => operate(operator, sideAt(left, row), sideAt(right, row)));
    default:
      return comparison(operator, left, right, rows);
  }
}

export function cellByCell(rows: number, cell: (row: number) => Cell): Column {
  const numbers = new Float64Array(rows);
  let others: (OtherCell | undefined)[] | undefined;
  for (let row = 0; row < rows; row++) {
    const value = cell(row);
    if (typeof value === "number") {
      numbers[row] = value;
    } else {
      numbers[row] = Number.NaN;
      others ??= new Array(rows).fill(undefined);
      others[row] = value;
    }
  }
  return { length: rows, numbers, others };
}

/** The numbers of a side, NaN where a cell is none; a step of 0 repeats one number. */
function packed(side: Side): { numbers: Float64Array; step: 0 | 1 } {
  if (!("same" in side)) {
    return { numbers: side.numbers, step: 1 };
  }
  return { numbers: Float64Array.of(typeof side.same === "number" ? side.same : Number.NaN), step: 0 };
}

function arithmetic(operator: "+" | "-" | "*" | "/" | "^", left: Side, right: Side, rows: number): Column {
  const a = packed(left);
  const b = packed(right);
  const numbers = new Float64Array(rows);
  loops[operator](a.numbers, a.step, b.numbers, b.step, numbers);
  let others: (OtherCell | undefined)[] | undefined;
  for (let row = 0; row < rows; row++) {
    const value = numbers[row] as number;
    // What is no number has come through as NaN; what overflowed as an infinity. Both are for `operate` to judge.
    if (value - value !== 0) {
      const cell = operate(operator, sideAt(left, row), sideAt(right, row));
      if (typeof cell === "number") {
        numbers[row] = cell;
      } else {
        numbers[row] = Number.NaN;
        others ??= new Array(rows).fill(undefined);
        others[row] = cell;
      }
    }
  }
  return { length: rows, numbers, others };
}

type Loop = (a: Float64Array, stepA: number, b: Float64Array, stepB: number, out: Float64Array) => void;

// One loop each, so that the inner operation is known when it is compiled.
const loops: Readonly<Record<"+" | "-" | "*" | "/" | "^", Loop>> = {
  "+": (a, stepA, b, stepB, out) => {
    for (let row = 0; row < out.length; row++) {
      out[row] = (a[row * stepA] as number) + (b[row * stepB] as number);
    }
  },
  "-": (a, stepA, b, stepB, out) => {
    for (let row = 0; row < out.length; row++) {
      out[row] = (a[row * stepA] as number) - (b[row * stepB] as number);
    }
  },
  "*": (a, stepA, b, stepB, out) => {
    for (let row = 0; row < out.length; row++) {
      out[row] = (a[row * stepA] as number) * (b[row * stepB] as number);
    }
  },
  "/": (a, stepA, b, stepB, out) => {
    for (let row = 0; row < out.length; row++) {
      out[row] = (a[row * stepA] as number) / (b[row * stepB] as number);
    }
  },
  "^": (a, stepA, b, stepB, out) => {
    for (let row = 0; row < out.length; row++) {
      const base = a[row * stepA] as number;
      const exponent = b[row * stepB] as number;
      // NaN ** 0 is 1, and 0 ** 0 is not for us to decide.
      out[row] = base === 0 || Number.isNaN(base) ? Number.NaN : base ** exponent;
    }
  },
};

function comparison(operator: Operator, left: Side, right: Side, rows: number): Column {
  const numbers = new Float64Array(rows).fill(Number.NaN);
  const others: (OtherCell | undefined)[] = new Array(rows);
  const a = packed(left);
  const b = packed(right);
  for (let row = 0; row < rows; row++) {
    const x = a.numbers[row * a.step] as number;
    const y = b.numbers[row * b.step] as number;
    others[row] =
      Number.isNaN(x) || Number.isNaN(y)
        ? (operate(operator, sideAt(left, row), sideAt(right, row)) as boolean)
        : compare(operator, x, y);
  }
  return { length: rows, numbers, others };
}

function compare(operator: Operator, x: number, y: number): boolean {
  switch (operator) {
    case "=":
      return x === y;
    case "<>":
      return x !== y;
    case "<":
      return x < y;
    case "<=":
      return x <= y;
    case ">":
      return x > y;
    default:
      return x >= y;
  }
}
