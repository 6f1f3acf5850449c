import { CellError } from "../../../../call/cell.js";
import type { Column } from "../../../../call/column.js";
import type { Book } from "../../../../sheet/book/book.js";

const counts = new WeakMap<Column, number>();

/** Chunks of cells that versions share are counted once. */
export function errorsInChunk(chunk: Column): number {
  if (chunk.others === undefined) return 0;
  let count = counts.get(chunk);
  if (count === undefined) {
    count = 0;
    for (const other of chunk.others) if (other instanceof CellError) count++;
    counts.set(chunk, count);
  }
  return count;
}

/** Cells that hold errors, over all sheets. */
export function errorCount(book: Book): number {
  let count = 0;
  for (const { columns } of book.sheets) {
    for (const { cells } of columns) for (const chunk of cells.chunks) count += errorsInChunk(chunk);
  }
  return count;
}
