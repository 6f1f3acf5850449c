import { CellError } from "../../../call/cell.js";
import type { Column } from "../../../call/column.js";
import type { Matrix } from "../../values/operand.js";

export interface Pairs {
  readonly left: Float64Array;
  readonly right: Float64Array;
}

/**
 * The pairs of two rectangles of one size in which both cells are numbers, row by row. Text, logicals and blanks take
 * their pair out; an error is the result.
 */
export function pairsOf(left: Matrix, right: Matrix, name: string): Pairs | CellError {
  if (left.rows * left.columns !== right.rows * right.columns) {
    return unequal(left, right, name);
  }
  const packed = packedColumn(left);
  const other = packedColumn(right);
  if (packed && other) {
    return { left: packed, right: other };
  }
  const lefts: number[] = [];
  const rights: number[] = [];
  for (let index = 0; index < left.rows * left.columns; index++) {
    const a = left.at(Math.floor(index / left.columns), index % left.columns);
    const b = right.at(Math.floor(index / right.columns), index % right.columns);
    if (a instanceof CellError) {
      return a;
    }
    if (b instanceof CellError) {
      return b;
    }
    if (typeof a === "number" && typeof b === "number") {
      lefts.push(a);
      rights.push(b);
    }
  }
  return { left: Float64Array.from(lefts), right: Float64Array.from(rights) };
}

function packedColumn(matrix: Matrix): Float64Array | undefined {
  const only = matrix.block?.columns.length === 1 ? (matrix.block.columns[0] as Column) : undefined;
  return only?.others === undefined ? only?.numbers : undefined;
}

function unequal(left: Matrix, right: Matrix, name: string): CellError {
  return new CellError(
    "#N/A",
    `${name}: ranges of unequal size`,
    `${name}: one range has ${left.rows * left.columns} cells, the other ${right.rows * right.columns}; ranges of the same size are needed`,
  );
}
