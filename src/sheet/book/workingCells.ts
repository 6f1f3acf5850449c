import type { Cell } from "../../call/cell.js";
import type { Column, OtherCell } from "../../call/column.js";
import { cellAt, sliceColumn } from "../../call/column.js";
import type { Cells } from "./cells.js";
import { blankColumn, cellsOfChunks, chunkIndexAt, chunkRows, sliceCells } from "./cells.js";

/** Views shorter than this are copied, so that reading a few cells does not freeze a chunk that is being written. */
const shortestView = 64;

/** Rows that a column has at least. */
const fewestRows = 16;

interface OwnChunk {
  readonly length: number;
  readonly numbers: Float64Array;
  others: (OtherCell | undefined)[] | undefined;
}

/**
 * The cells of a column while they are being written: chunks are copied on their first write and then written in
 * place, until somebody takes a view of them.
 */
export interface WorkingCells {
  length(): number;
  read(row: number): Cell;
  slice(from: number, to: number): Column;
  write(row: number, cell: Cell): void;
  writeColumn(from: number, column: Column): void;
  /** Where the chunk that holds `row` ends. */
  chunkEnd(row: number): number;
  /** The cells as they stand; to be read before the next write. */
  peek(): Cells;
  finish(): Cells;
}

export function workOn(original: Cells): WorkingCells {
  let cells: Cells = { ...original, chunks: original.chunks.slice() };
  let own = new Array<boolean>(cells.chunks.length).fill(false);

  const extend = (length: number): void => {
    if (length > cells.length) {
      const grown = cellsOfChunks([...cells.chunks, ...blanksBetween(cells.length, roomFor(length))]);
      own = [...own, ...new Array(grown.chunks.length - own.length).fill(false)];
      cells = grown;
    }
  };
  const ownChunk = (index: number): OwnChunk => {
    const chunk = cells.chunks[index] as Column;
    if (own[index]) {
      return chunk as OwnChunk;
    }
    const copy: OwnChunk = { length: chunk.length, numbers: chunk.numbers.slice(), others: chunk.others?.slice() };
    (cells.chunks as Column[])[index] = copy;
    own[index] = true;
    return copy;
  };

  return {
    length: () => cells.length,
    read(row) {
      if (row >= cells.length) {
        return null;
      }
      const index = chunkIndexAt(cells.starts, row);
      return cellAt(cells.chunks[index] as Column, row - (cells.starts[index] as number));
    },
    slice(from, to) {
      const slice = sliceCells(cells, from, to);
      if (to - from < shortestView) {
        return { ...slice, numbers: slice.numbers.slice() };
      }
      if (from < cells.length) {
        const last = chunkIndexAt(cells.starts, Math.min(to, cells.length) - 1);
        for (let index = chunkIndexAt(cells.starts, from); index <= last; index++) {
          own[index] = false;
        }
      }
      return slice;
    },
    write(row, cell) {
      extend(row + 1);
      const index = chunkIndexAt(cells.starts, row);
      const chunk = ownChunk(index);
      const at = row - (cells.starts[index] as number);
      if (typeof cell === "number") {
        chunk.numbers[at] = cell;
        if (chunk.others !== undefined) {
          chunk.others[at] = undefined;
        }
      } else {
        chunk.numbers[at] = Number.NaN;
        chunk.others ??= new Array(chunk.length).fill(undefined);
        chunk.others[at] = cell;
      }
    },
    writeColumn(from, column) {
      extend(from + column.length);
      let row = 0;
      while (row < column.length) {
        const index = chunkIndexAt(cells.starts, from + row);
        const start = cells.starts[index] as number;
        const chunkLength = (cells.chunks[index] as Column).length;
        const at = from + row - start;
        const count = Math.min(column.length - row, chunkLength - at);
        const part = count === column.length ? column : sliceColumn(column, row, row + count);
        if (count === chunkLength) {
          (cells.chunks as Column[])[index] = { length: count, numbers: part.numbers, others: part.others };
          own[index] = false;
        } else {
          copyInto(ownChunk(index), at, part);
        }
        row += count;
      }
    },
    chunkEnd(row) {
      if (row >= cells.length) {
        return Number.POSITIVE_INFINITY;
      }
      const index = chunkIndexAt(cells.starts, row);
      return (cells.starts[index] as number) + (cells.chunks[index] as Column).length;
    },
    peek: () => cells,
    finish() {
      own.fill(false);
      return { ...cells, chunks: cells.chunks.slice() };
    },
  };
}

/** Rows to have for so many: some to spare, so that a column typed cell by cell does not end in splinters. */
function roomFor(length: number): number {
  return length > chunkRows / 2
    ? Math.ceil(length / chunkRows) * chunkRows
    : Math.max(fewestRows, 2 ** Math.ceil(Math.log2(length)));
}

/** Blank chunks that end where the chunks of other columns do. */
function blanksBetween(from: number, to: number): Column[] {
  const chunks: Column[] = [];
  for (let row = from; row < to; ) {
    const end = Math.min(to, (Math.floor(row / chunkRows) + 1) * chunkRows);
    chunks.push(blankColumn(end - row));
    row = end;
  }
  return chunks;
}

function copyInto(chunk: OwnChunk, at: number, part: Column): void {
  chunk.numbers.set(part.numbers, at);
  if (part.others === undefined && chunk.others === undefined) {
    return;
  }
  chunk.others ??= new Array(chunk.length).fill(undefined);
  for (let index = 0; index < part.length; index++) {
    chunk.others[at + index] = part.others?.[index];
  }
}
