import { CellError } from "../../../call/cell.js";
import type { Column } from "../../../call/column.js";
import type { Matrix, Operand } from "../../values/operand.js";
import { isMatrix } from "../../values/operand.js";
import { toNumber } from "../../values/toNumber.js";

/** Whether text and logicals within a rectangle are left out, or count as the A-functions have it: text 0, TRUE 1. */
export type Others = "leave out" | "count";

/**
 * The numbers in the arguments of an aggregate (ISO/IEC 26300-3 section 6.3.7): a single value is converted to a
 * number, of a rectangle only the numbers count. The first error in the order of the arguments is the result. The
 * array may share memory with a cell column: read only.
 */
export function numbersOf(
  operands: readonly Operand[],
  what: string,
  others: Others = "leave out",
): Float64Array | CellError {
  const only = operands[0];
  if (operands.length === 1 && isMatrix(only) && only.block?.columns.length === 1) {
    return numbersOfColumn(only.block.columns[0] as Column, others);
  }
  const found = new Numbers();
  for (const operand of operands) {
    const error = isMatrix(operand) ? found.addMatrix(operand, others) : found.addValue(toNumber(operand, what));
    if (error) {
      return error;
    }
  }
  return found.all();
}

function numbersOfColumn(column: Column, others: Others): Float64Array | CellError {
  return column.others === undefined ? column.numbers : compact(column, column.others, others);
}

function compact(column: Column, cells: NonNullable<Column["others"]>, others: Others): Float64Array | CellError {
  const kept = new Float64Array(column.length);
  let count = 0;
  for (let row = 0; row < column.length; row++) {
    const other = cells[row];
    if (other === undefined) {
      kept[count++] = column.numbers[row] as number;
    } else if (other instanceof CellError) {
      return other;
    } else if (others === "count" && other !== null) {
      kept[count++] = other === true ? 1 : 0;
    }
  }
  return kept.subarray(0, count);
}

/** Numbers as they are found, in pieces of the columns they come from. */
class Numbers {
  private readonly pieces: Float64Array[] = [];

  addValue(value: number | CellError): CellError | undefined {
    if (value instanceof CellError) {
      return value;
    }
    this.pieces.push(Float64Array.of(value));
    return undefined;
  }

  addMatrix(matrix: Matrix, others: Others): CellError | undefined {
    if (matrix.block) {
      for (const column of matrix.block.columns) {
        const piece = numbersOfColumn(column, others);
        if (piece instanceof CellError) {
          return piece;
        }
        this.pieces.push(piece);
      }
      return undefined;
    }
    const found: number[] = [];
    for (let row = 0; row < matrix.rows; row++) {
      for (let column = 0; column < matrix.columns; column++) {
        const cell = matrix.at(row, column);
        if (typeof cell === "number") {
          found.push(cell);
        } else if (cell instanceof CellError) {
          return cell;
        } else if (others === "count" && cell !== null) {
          found.push(cell === true ? 1 : 0);
        }
      }
    }
    this.pieces.push(Float64Array.from(found));
    return undefined;
  }

  all(): Float64Array {
    if (this.pieces.length === 1) {
      return this.pieces[0] as Float64Array;
    }
    const together = new Float64Array(this.pieces.reduce((length, piece) => length + piece.length, 0));
    let offset = 0;
    for (const piece of this.pieces) {
      together.set(piece, offset);
      offset += piece.length;
    }
    return together;
  }
}
