import type { Cell } from "./cell.js";

/** A cell that is not a number. */
export type OtherCell = Exclude<Cell, number>;

/**
 * Cells below each other, numbers packed. A number stands in `numbers` and is finite. Whatever else a cell holds
 * stands in `others` at the same index, and `numbers` holds NaN there; `others` is undefined where every cell is a number.
 */
export interface Column {
  readonly length: number;
  readonly numbers: Float64Array;
  readonly others: readonly (OtherCell | undefined)[] | undefined;
}

/** A rectangle of cells, as columns of one length. */
export interface Block {
  readonly rows: number;
  readonly columns: readonly Column[];
}

export function cellAt(column: Column, row: number): Cell {
  const other = column.others?.[row];
  return other === undefined ? (column.numbers[row] as number) : other;
}

export function columnOf(cells: readonly Cell[]): Column {
  const numbers = new Float64Array(cells.length);
  let others: (OtherCell | undefined)[] | undefined;
  for (let row = 0; row < cells.length; row++) {
    const cell = cells[row] as Cell;
    if (typeof cell === "number") {
      numbers[row] = cell;
    } else {
      numbers[row] = Number.NaN;
      others ??= new Array(cells.length).fill(undefined);
      others[row] = cell;
    }
  }
  return { length: cells.length, numbers, others };
}

/** The cells from row `from` up to but not including row `to`; numbers are shared, not copied. */
export function sliceColumn(column: Column, from: number, to: number): Column {
  return {
    length: to - from,
    numbers: column.numbers.subarray(from, to),
    others: column.others?.slice(from, to),
  };
}

export function blockOf(cells: readonly (readonly Cell[])[]): Block {
  const width = cells[0]?.length ?? 0;
  const columns = Array.from({ length: width }, (_, index) => columnOf(cells.map((row) => row[index] as Cell)));
  return { rows: cells.length, columns };
}

export function cellsOf(block: Block): Cell[][] {
  return Array.from({ length: block.rows }, (_, row) => block.columns.map((column) => cellAt(column, row)));
}
