import type { Cell } from "../../../call/cell.js";
import type { Column, OtherCell } from "../../../call/column.js";
import type { Cells } from "../../../sheet/book/cells.js";
import { blankColumn, cellsOfChunks, chunkRows } from "../../../sheet/book/cells.js";
import { tooLarge } from "../../zip/zipProblem.js";

/** Cells that a workbook may take memory for: a million rows by 40 columns. */
export const mostCells = 40_000_000;

/** How many cells may still be made. */
export interface CellBudget {
  left: number;
}

export function spendCells(budget: CellBudget, cells: number): void {
  budget.left -= cells;
  if (budget.left < 0) {
    throw tooLarge(`it has more than ${mostCells.toLocaleString("en")} cells`);
  }
}

/** A column that is read from top to bottom. */
export interface CellsBuilder {
  /** The first row that is still to come. */
  readonly next: number;
  put(row: number, cell: Cell): void;
  finish(): Cells;
}

/** Blank rows that are kept as cells; a longer gap becomes blank chunks that all columns share. */
const longestGap = 32;
/** What a chunk costs besides its cells, in cells. */
const chunkCost = 16;
const firstRows = 16;

export function cellsBuilder(budget: CellBudget): CellsBuilder {
  const chunks: Column[] = [];
  let base = 0;
  let length = 0;
  let numbers = new Float64Array(firstRows);
  let others: (OtherCell | undefined)[] | undefined;

  const addChunk = (chunk: Column): void => {
    spendCells(budget, chunkCost);
    chunks.push(chunk);
  };
  const flush = (): void => {
    if (length > 0) {
      const isFull = numbers.length === length;
      addChunk({ length, numbers: isFull ? numbers : numbers.slice(0, length), others });
      base += length;
      const next = isFull ? Math.min(length, chunkRows) : firstRows;
      spendCells(budget, next);
      numbers = new Float64Array(next);
      length = 0;
      others = undefined;
    }
  };
  const append = (cell: Cell): void => {
    if (length > 0 && (base + length) % chunkRows === 0) {
      flush();
    }
    if (length === numbers.length) {
      const grown = new Float64Array(Math.min(length * 2, chunkRows));
      spendCells(budget, grown.length - length);
      grown.set(numbers);
      numbers = grown;
    }
    if (typeof cell === "number") {
      numbers[length] = cell;
      others?.push(undefined);
    } else {
      numbers[length] = Number.NaN;
      others ??= new Array(length).fill(undefined);
      others.push(cell);
    }
    length++;
  };
  const skip = (to: number): void => {
    flush();
    while (base < to) {
      const end = Math.min(to, (Math.floor(base / chunkRows) + 1) * chunkRows);
      addChunk(sharedBlank(end - base));
      base += chunks.at(-1)?.length ?? 0;
    }
  };

  return {
    get next() {
      return base + length;
    },
    put(row, cell) {
      if (row - base - length > longestGap) {
        skip(row);
      }
      while (base + length < row) {
        append(null);
      }
      append(cell);
    },
    finish() {
      flush();
      return cellsOfChunks(chunks);
    },
  };
}

const blanks = new Map<number, Column>();

/** Blank cells, at most so many; one column for each power of two. */
function sharedBlank(most: number): Column {
  const length = 2 ** Math.floor(Math.log2(most));
  const blank = blanks.get(length) ?? blankColumn(length);
  blanks.set(length, blank);
  return blank;
}
