import type { Column } from "../../call/column.js";
import { cellAt } from "../../call/column.js";
import type { Book, Sheet } from "./book.js";
import type { Cells } from "./cells.js";

/** The number of rows down to the last cell that is not blank. */
export function usedLength(cells: Cells): number {
  for (let index = cells.chunks.length - 1; index >= 0; index--) {
    const chunk = cells.chunks[index] as Column;
    for (let row = chunk.length - 1; row >= 0; row--) {
      if (cellAt(chunk, row) !== null) {
        return (cells.starts[index] as number) + row + 1;
      }
    }
  }
  return 0;
}

export function usedRows(book: Book, sheet: number): number {
  const columns = book.sheets[sheet]?.columns ?? [];
  return columns.reduce((most, { cells }) => Math.max(most, usedLength(cells)), 0);
}

export function usedColumns(book: Book, sheet: number): number {
  return columnsInUse(book.sheets[sheet]);
}

export function columnsInUse(sheet: Sheet | undefined): number {
  const columns = sheet?.columns ?? [];
  let last = columns.length;
  while (last > 0 && usedLength((columns[last - 1] as Sheet["columns"][number]).cells) === 0) {
    last--;
  }
  return last;
}
