import type { Cell } from "../../call/cell.js";
import type { Column } from "../../call/column.js";
import { cellAt, columnOf } from "../../call/column.js";
import type { Matrix, Operand } from "../values/operand.js";
import { isMatrix } from "../values/operand.js";

/** What a part of a formula is worth over many rows, rows counted from the first of them. */
export type Rows =
  | { readonly kind: "same"; readonly operand: Operand }
  /** A cell a row; `reference` where they are cells of the sheet. */
  | { readonly kind: "column"; readonly column: Column; readonly reference: boolean }
  /** Cells side by side a row. Where `ragged`, blanks at the end of a row are no part of its result. */
  | { readonly kind: "columns"; readonly columns: readonly Column[]; readonly ragged: boolean }
  /** Anything else, worked out row by row. */
  | { readonly kind: "each"; readonly at: (row: number) => Operand };

export function rowAt(rows: Rows, row: number): Operand {
  switch (rows.kind) {
    case "same":
      return rows.operand;
    case "column":
      return rows.reference ? oneCell(cellAt(rows.column, row)) : cellAt(rows.column, row);
    case "columns":
      return rowOfColumns(rows.columns, row, rows.ragged);
    case "each":
      return rows.at(row);
  }
}

function rowOfColumns(columns: readonly Column[], row: number, ragged: boolean): Operand {
  let width = columns.length;
  while (ragged && width > 1 && cellAt(columns[width - 1] as Column, row) === null) {
    width--;
  }
  if (ragged && width === 1) {
    return cellAt(columns[0] as Column, row);
  }
  const cells = columns.slice(0, width).map((column) => cellAt(column, row));
  return { rows: 1, columns: width, reference: !ragged, at: (_, column) => cells[column] as Cell };
}

/** A reference to one cell. */
export function oneCell(cell: Cell): Operand {
  return { rows: 1, columns: 1, reference: true, at: () => cell };
}

/** The one cell an operand is, or undefined where it is a rectangle. */
export function scalarOf(operand: Operand): Cell | undefined {
  if (!isMatrix(operand)) {
    return operand;
  }
  return operand.rows === 1 && operand.columns === 1 ? operand.at(0, 0) : undefined;
}

/** Wider results than this stay row by row. */
const widestPacked = 16;

/** What every row is worth, packed as a column or as columns where each of them lies in its row. */
export function gatherRows(count: number, at: (row: number) => Operand): Rows {
  const operands = new Array<Operand>(count);
  let width = 1;
  let packs = true;
  for (let row = 0; row < count; row++) {
    const operand = at(row);
    const cell = scalarOf(operand);
    operands[row] = cell === undefined ? operand : cell;
    if (cell === undefined && isMatrix(operand)) {
      width = Math.max(width, operand.columns);
      packs &&= operand.rows === 1 && operand.columns <= widestPacked && endsFilled(operand);
    }
  }
  if (width === 1 && packs) {
    return { kind: "column", column: columnOf(operands as Cell[]), reference: false };
  }
  if (!packs) {
    return { kind: "each", at: (row) => operands[row] as Operand };
  }
  const columns = Array.from({ length: width }, (_, index) =>
    columnOf(operands.map((operand) => cellBeside(operand, index))),
  );
  return { kind: "columns", columns, ragged: true };
}

/** Whether the last cell counts: a blank there could not be told from no cell. Blanks that are referred to count as 0. */
function endsFilled(matrix: Matrix): boolean {
  return matrix.reference || matrix.at(0, matrix.columns - 1) !== null;
}

function cellBeside(operand: Operand, index: number): Cell {
  if (!isMatrix(operand)) {
    return index === 0 ? (operand ?? 0) : null;
  }
  if (index >= operand.columns) {
    return null;
  }
  return operand.reference ? (operand.at(0, index) ?? 0) : operand.at(0, index);
}
