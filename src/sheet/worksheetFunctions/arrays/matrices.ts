import { CellError } from "../../../call/cell.js";
import type { Matrix } from "../../values/operand.js";
import { buildMatrix } from "../../values/operand.js";
import { define, notFinite } from "../define/define.js";
import { outside } from "../define/outside.js";
import { matrix, whole } from "../define/parameters.js";
import type { Table } from "../numerics/linear.js";
import { factorize, solve } from "../numerics/linear.js";
import { sumOf } from "../numerics/sum.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

/** The numbers of a rectangle; a cell that holds none is an error. */
export function tableOf(range: Matrix, name: string): Table | CellError {
  const values = new Float64Array(range.rows * range.columns);
  for (let row = 0; row < range.rows; row++) {
    for (let column = 0; column < range.columns; column++) {
      const cell = range.at(row, column);
      if (typeof cell !== "number") {
        return cell instanceof CellError
          ? cell
          : outside(`${name}: array`, cell, "no number", "numbers in every cell are needed", "#VALUE!");
      }
      values[row * range.columns + column] = cell;
    }
  }
  return { rows: range.rows, columns: range.columns, values };
}

/** A rectangle of numbers as cells; what is not finite is an error in its place. */
export function numberMatrix(
  name: string,
  rows: number,
  columns: number,
  at: (row: number, column: number) => number,
): Matrix {
  return buildMatrix(rows, columns, (row, column) => {
    const value = at(row, column);
    return Number.isFinite(value) ? value : notFinite(name);
  });
}

const multiply = define("MMULT", [matrix("left array"), matrix("right array")] as const, (left, right) => {
  const a = tableOf(left, "MMULT");
  const b = tableOf(right, "MMULT");
  if (a instanceof CellError || b instanceof CellError) {
    return a instanceof CellError ? a : (b as CellError);
  }
  if (a.columns !== b.rows) {
    return new CellError(
      "#VALUE!",
      "MMULT: arrays that do not fit",
      `MMULT: the left array has ${a.columns} columns, the right ${b.rows} rows; as many rows as columns are needed`,
    );
  }
  return numberMatrix("MMULT", a.rows, b.columns, (row, column) =>
    sumOf(
      a.columns,
      (index) => (a.values[row * a.columns + index] as number) * (b.values[index * b.columns + column] as number),
    ),
  );
});

function square(range: Matrix, name: string): Table | CellError {
  const table = tableOf(range, name);
  return table instanceof CellError || table.rows === table.columns
    ? table
    : new CellError(
        "#VALUE!",
        `${name}: array is not square`,
        `${name}: array has ${table.rows} rows and ${table.columns} columns; as many rows as columns are needed`,
      );
}

const determinant = define("MDETERM", [matrix("array")] as const, (range) => {
  const table = square(range, "MDETERM");
  if (table instanceof CellError) {
    return table;
  }
  const { lu, sign, singular } = factorize(table);
  let product = sign;
  for (let row = 0; row < table.rows; row++) {
    product *= lu[row * table.rows + row] as number;
  }
  return singular ? 0 : product;
});

const inverse = define("MINVERSE", [matrix("array")] as const, (range) => {
  const table = square(range, "MINVERSE");
  if (table instanceof CellError) {
    return table;
  }
  const factors = factorize(table);
  if (factors.singular) {
    return new CellError(
      "#NUM!",
      "MINVERSE: array has no inverse",
      "MINVERSE: array has no inverse, its determinant is 0; rows that do not depend on each other are needed",
    );
  }
  const columns = Array.from({ length: table.rows }, (_, column) =>
    solve(
      factors,
      Array.from({ length: table.rows }, (__, row) => (row === column ? 1 : 0)),
    ),
  );
  return numberMatrix(
    "MINVERSE",
    table.rows,
    table.rows,
    (row, column) => (columns[column] as number[])[row] as number,
  );
});

/** Section 6.5. */
export const matrices: readonly WorksheetFunction[] = [
  multiply,
  determinant,
  inverse,
  define("MUNIT", [whole("size")] as const, (size) =>
    size < 1 || size > 1000
      ? outside(
          "MUNIT: size",
          size,
          "outside 1 to 1000",
          "a whole number of 1 or more is needed, for example 3",
          "#VALUE!",
        )
      : buildMatrix(size, size, (row, column) => (row === column ? 1 : 0)),
  ),
];
