import type { Cell } from "../../../call/cell.js";
import type { Column } from "../../../call/column.js";
import { cellAt } from "../../../call/column.js";
import type { Matrix } from "../../values/operand.js";

/** Cells in a row, whichever way they lie. */
export interface Vector {
  readonly length: number;
  at(index: number): Cell;
  /** The packed column, where the cells are one. */
  readonly column?: Column;
}

export function columnVector(matrix: Matrix, column: number): Vector {
  const packed = matrix.block?.columns[column];
  return packed
    ? { length: matrix.rows, at: (index) => cellAt(packed, index), column: packed }
    : { length: matrix.rows, at: (index) => matrix.at(index, column) };
}

export function rowVector(matrix: Matrix, row: number): Vector {
  return { length: matrix.columns, at: (index) => matrix.at(row, index) };
}

/** The cells of a rectangle that is one row or one column. */
export function vectorOf(matrix: Matrix): Vector | undefined {
  return matrix.columns === 1 ? columnVector(matrix, 0) : matrix.rows === 1 ? rowVector(matrix, 0) : undefined;
}
