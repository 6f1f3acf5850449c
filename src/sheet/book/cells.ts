import type { Cell } from "../../call/cell.js";
import type { Column, OtherCell } from "../../call/column.js";
import { cellAt, sliceColumn } from "../../call/column.js";

/** Rows a chunk holds at most: small enough to copy for one edit, large enough to be read as an array. */
export const chunkRows = 8192;

/** The cells of one sheet column, in chunks that versions share. Rows past the end are blank. */
export interface Cells {
  readonly length: number;
  readonly chunks: readonly Column[];
  /** The first row of each chunk. */
  readonly starts: readonly number[];
}

export const noCells: Cells = { length: 0, chunks: [], starts: [] };

export function cellsOfChunks(chunks: readonly Column[]): Cells {
  const starts: number[] = [];
  let length = 0;
  for (const chunk of chunks) {
    starts.push(length);
    length += chunk.length;
  }
  return { length, chunks, starts };
}

/** The index of the chunk that holds `row`, which must be below the length. */
export function chunkIndexAt(starts: readonly number[], row: number): number {
  let low = 0;
  let high = starts.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if ((starts[middle] as number) <= row) {
      low = middle;
    } else {
      high = middle - 1;
    }
  }
  return low;
}

export function readCell(cells: Cells, row: number): Cell {
  if (row >= cells.length) {
    return null;
  }
  const index = chunkIndexAt(cells.starts, row);
  return cellAt(cells.chunks[index] as Column, row - (cells.starts[index] as number));
}

const blankChunk = makeBlank(chunkRows);

function makeBlank(length: number): Column {
  return { length, numbers: new Float64Array(length).fill(Number.NaN), others: new Array(length).fill(null) };
}

export function blankColumn(length: number): Column {
  return length === chunkRows
    ? blankChunk
    : length < chunkRows
      ? sliceColumn(blankChunk, 0, length)
      : makeBlank(length);
}

/** Some rows of a column; where all of them are numbers it says so. */
function partOf(column: Column, from: number, to: number): Column {
  if (from === 0 && to === column.length) {
    return column;
  }
  const part = sliceColumn(column, from, to);
  return part.others?.every((other) => other === undefined) ? { ...part, others: undefined } : part;
}

/** Rows `from` up to `to` as one column: shared where they lie in one chunk, else copied. */
export function sliceCells(cells: Cells, from: number, to: number): Column {
  if (to <= cells.length && from < to) {
    const index = chunkIndexAt(cells.starts, from);
    const start = cells.starts[index] as number;
    const chunk = cells.chunks[index] as Column;
    if (to <= start + chunk.length) {
      return partOf(chunk, from - start, to - start);
    }
  }
  return joinColumns(piecesOf(cells, from, to));
}

/** The parts of chunks that make up rows `from` up to `to`, blanks past the end included. */
export function piecesOf(cells: Cells, from: number, to: number): Column[] {
  const pieces: Column[] = [];
  let row = from;
  for (let index = row < cells.length ? chunkIndexAt(cells.starts, row) : cells.chunks.length; row < to; index++) {
    const chunk = cells.chunks[index];
    if (chunk === undefined) {
      for (; row < to; row += chunkRows) {
        pieces.push(blankColumn(Math.min(chunkRows, to - row)));
      }
      break;
    }
    const start = cells.starts[index] as number;
    const end = Math.min(to, start + chunk.length);
    pieces.push(partOf(chunk, row - start, end - start));
    row = end;
  }
  return pieces;
}

export function joinColumns(pieces: readonly Column[]): Column {
  if (pieces.length === 1) {
    return pieces[0] as Column;
  }
  const length = pieces.reduce((sum, piece) => sum + piece.length, 0);
  const numbers = new Float64Array(length);
  let others: (OtherCell | undefined)[] | undefined;
  let row = 0;
  for (const piece of pieces) {
    numbers.set(piece.numbers, row);
    if (piece.others !== undefined) {
      others ??= new Array(length).fill(undefined);
      for (let index = 0; index < piece.length; index++) {
        others[row + index] = piece.others[index];
      }
    }
    row += piece.length;
  }
  return { length, numbers, others };
}

/** A column cut into chunks; the numbers are shared. */
export function chunksOf(column: Column): Column[] {
  if (column.length <= chunkRows) {
    return column.length === 0 ? [] : [column];
  }
  const chunks: Column[] = [];
  for (let row = 0; row < column.length; row += chunkRows) {
    chunks.push(partOf(column, row, Math.min(column.length, row + chunkRows)));
  }
  return chunks;
}

/** Rows `from` up to `to` taken out and other chunks put in their place. */
export function spliceCells(cells: Cells, from: number, to: number, chunks: readonly Column[]): Cells {
  const before = piecesOf(cells, 0, from);
  const after = to < cells.length ? piecesOf(cells, to, cells.length) : [];
  return cellsOfChunks(joinSmall([...before, ...chunks, ...after]));
}

/** Neighbouring small chunks made one, so that many edits do not leave splinters. */
function joinSmall(chunks: readonly Column[]): Column[] {
  const joined: Column[] = [];
  for (const chunk of chunks) {
    const last = joined.at(-1);
    if (last !== undefined && last.length + chunk.length <= chunkRows / 2) {
      joined[joined.length - 1] = joinColumns([last, chunk]);
    } else if (chunk.length > 0) {
      joined.push(chunk);
    }
  }
  return joined;
}
