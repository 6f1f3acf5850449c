import { sliceColumn } from "../../call/column.js";
import type { Matrix } from "./operand.js";

/** A rectangle within a rectangle; cells are shared, not copied. */
export function partOf(matrix: Matrix, row: number, rows: number, column: number, columns: number): Matrix {
  const { block, reference } = matrix;
  const at: Matrix["at"] = (r, c) => matrix.at(row + r, column + c);
  if (!block) {
    return { rows, columns, reference, at };
  }
  const chosen = block.columns.slice(column, column + columns);
  const cut = rows === matrix.rows ? chosen : chosen.map((each) => sliceColumn(each, row, row + rows));
  return { rows, columns, reference, at, block: { rows, columns: cut } };
}
