import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import type { Operand } from "./operand.js";
import { buildMatrix, isMatrix } from "./operand.js";
import type { Operator } from "./operate.js";
import { operate } from "./operate.js";

/**
 * One operator between two operands: cell by cell where one of them is a rectangle, one row or one column repeating
 * (ISO/IEC 26300-3 section 3.3). A 1 x 1 rectangle is its cell.
 */
export function operateOperands(operator: Operator, left: Operand, right: Operand): Operand {
  const rows = Math.max(rowsOf(left), rowsOf(right));
  const columns = Math.max(columnsOf(left), columnsOf(right));
  if (rows === 1 && columns === 1) {
    return operate(operator, elementAt(left, 0, 0), elementAt(right, 0, 0));
  }
  return buildMatrix(rows, columns, (row, column) =>
    operate(operator, elementAt(left, row, column), elementAt(right, row, column)),
  );
}

function rowsOf(operand: Operand): number {
  return isMatrix(operand) ? operand.rows : 1;
}

function columnsOf(operand: Operand): number {
  return isMatrix(operand) ? operand.columns : 1;
}

/** The cell of an operand that belongs to one place of a larger rectangle. */
export function elementAt(operand: Operand, row: number, column: number): Cell {
  if (!isMatrix(operand)) {
    return operand;
  }
  const useRow = operand.rows === 1 ? 0 : row;
  const useColumn = operand.columns === 1 ? 0 : column;
  if (useRow < operand.rows && useColumn < operand.columns) {
    return operand.at(useRow, useColumn);
  }
  return new CellError(
    "#N/A",
    "rectangles of unequal size",
    `one rectangle has ${operand.rows} rows and ${operand.columns} columns, the other is larger; rectangles of the same size are needed`,
  );
}
