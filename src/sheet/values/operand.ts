import type { Cell } from "../../call/cell.js";
import type { Block, Column, OtherCell } from "../../call/column.js";
import { cellAt } from "../../call/column.js";

/** A rectangle of cells as an operator or a function takes it and gives it. */
export interface Matrix {
  readonly rows: number;
  readonly columns: number;
  /** Whether the rectangle is cells of a sheet, not an array made by a formula. */
  readonly reference: boolean;
  /** Row and column count from zero. */
  at(row: number, column: number): Cell;
  /** The same cells as packed columns, where they lie that way: functions over many cells read these. */
  readonly block?: Block;
}

/** What a part of a formula is worth: one cell or a rectangle. A reference to one cell is a 1 x 1 matrix. */
export type Operand = Cell | Matrix;

export function isMatrix(operand: Operand | undefined): operand is Matrix {
  return typeof operand === "object" && operand !== null && "at" in operand;
}

export function matrixOfBlock(block: Block, reference = false): Matrix {
  const { columns } = block;
  return {
    rows: block.rows,
    columns: columns.length,
    reference,
    block,
    at: (row, column) => cellAt(columns[column] as Block["columns"][number], row),
  };
}

/** A matrix whose cells are worked out once, here. */
export function buildMatrix(rows: number, columns: number, cell: (row: number, column: number) => Cell): Matrix {
  const built = Array.from({ length: columns }, (_, column) => buildColumn(rows, (row) => cell(row, column)));
  return matrixOfBlock({ rows, columns: built });
}

function buildColumn(length: number, cell: (row: number) => Cell): Column {
  const numbers = new Float64Array(length);
  let others: (OtherCell | undefined)[] | undefined;
  for (let row = 0; row < length; row++) {
    const value = cell(row);
    if (typeof value === "number") {
      numbers[row] = value;
    } else {
      numbers[row] = Number.NaN;
      others ??= new Array(length).fill(undefined);
      others[row] = value;
    }
  }
  return { length, numbers, others };
}

/** A rectangle written row by row. */
export function matrixOfRows(rows: readonly (readonly Cell[])[]): Matrix {
  const width = rows[0]?.length ?? 0;
  return buildMatrix(rows.length, width, (row, column) => (rows[row] as readonly Cell[])[column] as Cell);
}
