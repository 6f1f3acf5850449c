import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import type { Column } from "../../call/column.js";
import { cellAt } from "../../call/column.js";
import type { Book, Place, Run, SheetColumn } from "../book/book.js";
import { columnAt } from "../book/book.js";
import { chunkIndexAt } from "../book/cells.js";
import { firstSpanAfter } from "../book/spans.js";
import { formulaText, sameFormula } from "../formula/formula.js";

export interface CellState {
  readonly value: Cell;
  /** As typed in that cell; worked out when it is read. */
  readonly formula: string | undefined;
}

export interface CellChange extends Place {
  readonly before: CellState;
  readonly after: CellState;
}

/**
 * The cells whose value, formula or error differs between two books, sheet by sheet (by their position), column by
 * column, as they are asked for. What the books share is not looked at.
 */
export function* changes(before: Book, after: Book): Generator<CellChange, void> {
  const sheets = Math.max(before.sheets.length, after.sheets.length);
  for (let sheet = 0; sheet < sheets; sheet++) {
    const width = Math.max(before.sheets[sheet]?.columns.length ?? 0, after.sheets[sheet]?.columns.length ?? 0);
    for (let column = 0; column < width; column++) {
      yield* columnChanges({ sheet, column }, columnAt(before, sheet, column), columnAt(after, sheet, column));
    }
  }
}

function* columnChanges(
  at: { readonly sheet: number; readonly column: number },
  before: SheetColumn,
  after: SheetColumn,
): Generator<CellChange, void> {
  if (before === after) {
    return;
  }
  const end = Math.max(before.cells.length, after.cells.length);
  for (let row = 0; row < end; ) {
    const old = stretchAt(before, row, end);
    const now = stretchAt(after, row, end);
    const to = Math.min(old.to, now.to);
    const same = sameRunFormula(old.run, now.run);
    if (!same || old.chunk !== now.chunk || old.start !== now.start) {
      for (; row < to; row++) {
        const value = cellIn(old, row);
        const next = cellIn(now, row);
        if (!same || !sameCell(value, next)) {
          yield {
            ...at,
            row,
            before: stateOf(value, old.run, row, at.column),
            after: stateOf(next, now.run, row, at.column),
          };
        }
      }
    }
    row = to;
  }
}

/** Rows of a column that lie in one chunk, and under one formula or none. */
interface ColumnStretch {
  readonly chunk: Column | undefined;
  readonly start: number;
  readonly run: Run | undefined;
  readonly to: number;
}

function stretchAt({ cells, runs }: SheetColumn, row: number, end: number): ColumnStretch {
  const index = row < cells.length ? chunkIndexAt(cells.starts, row) : -1;
  const chunk = cells.chunks[index];
  const start = index < 0 ? 0 : (cells.starts[index] as number);
  const next = runs[firstSpanAfter(runs, row)];
  const run = next !== undefined && next.from <= row ? next : undefined;
  const runEnd = next === undefined ? end : run === undefined ? next.from : run.to;
  return { chunk, start, run, to: Math.min(end, runEnd, chunk === undefined ? end : start + chunk.length) };
}

function cellIn({ chunk, start }: ColumnStretch, row: number): Cell {
  return chunk === undefined ? null : cellAt(chunk, row - start);
}

function sameRunFormula(a: Run | undefined, b: Run | undefined): boolean {
  return a === undefined || b === undefined ? a === b : sameFormula(a.formula, b.formula);
}

/** Equal to the last bit; errors that say the same are the same. */
export function sameCell(a: Cell, b: Cell): boolean {
  if (a instanceof CellError && b instanceof CellError) {
    return a === b || (a.code === b.code && a.topic === b.topic && a.message === b.message);
  }
  return Object.is(a, b);
}

function stateOf(value: Cell, run: Run | undefined, row: number, column: number): CellState {
  return {
    value,
    get formula() {
      return run && formulaText(run.formula, row, column);
    },
  };
}
