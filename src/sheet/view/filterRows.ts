import type { Cell } from "../../call/cell.js";
import { cellAt } from "../../call/column.js";
import type { Area, Book } from "../book/book.js";
import { columnAt } from "../book/book.js";
import { sliceCells } from "../book/cells.js";

export interface Filter {
  readonly column: number;
  readonly keeps: (cell: Cell) => boolean;
}

/** The rows of an area that all filters keep, in their order: a way of looking, the book stays as it is. */
export function filterRows(book: Book, area: Area, filters: readonly Filter[]): Int32Array {
  const { sheet, top, bottom } = area;
  const kept = new Uint8Array(bottom + 1 - top).fill(1);
  for (const { column, keeps } of filters) {
    const cells = sliceCells(columnAt(book, sheet, column).cells, top, bottom + 1);
    for (let row = 0; row < kept.length; row++) {
      if (kept[row] === 1 && !keeps(cellAt(cells, row))) {
        kept[row] = 0;
      }
    }
  }
  const rows = new Int32Array(kept.reduce((sum, each) => sum + each, 0));
  let next = 0;
  for (let row = 0; row < kept.length; row++) {
    if (kept[row] === 1) {
      rows[next++] = top + row;
    }
  }
  return rows;
}
