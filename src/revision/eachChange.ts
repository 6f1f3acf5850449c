import type { Cell } from "../call/cell.js";
import { type Column, cellAt, columnOf } from "../call/column.js";
import { cellOf } from "../sheet/book/cellOf.js";
import { chunkRows } from "../sheet/book/cells.js";
import { sameValue } from "../table/changeOf.js";
import { convertColumn, convertSigmas } from "../table/convertColumn.js";
import type { RowPair } from "../table/matchRows.js";
import type { ColumnPair } from "../table/pairColumns.js";
import { type BookColumn, type BookTable, tableCells } from "./bookTable.js";

/** Two states of a table whose rows were matched. */
export interface TwoStates {
  readonly before: BookTable;
  readonly after: BookTable;
  /** Undefined where the rows are the same ones in the same order. */
  readonly rows: readonly RowPair[] | undefined;
}

export type VisitChange = (at: number, before: Cell, after: Cell, sigma: number | undefined) => void;

/** Cells of both states, some rows at a time: what lies in one chunk of the sheet is read without a copy. */
interface Stretch {
  readonly from: number;
  readonly before: Column;
  readonly after: Column;
  sigma(row: number): number | undefined;
}

/** Visits the cells of a column that differ, with the uncertainty before or else after; values are in the unit before. */
export function eachChange(states: TwoStates, pair: ColumnPair<BookColumn>, visit: VisitChange): void {
  for (const { from, before, after, sigma } of stretchesOf(states, pair)) {
    if (before.numbers === after.numbers && before.others === after.others) continue;
    const isPacked = before.others === undefined && after.others === undefined;
    for (let row = 0; row < before.length; row++) {
      if (isPacked && before.numbers[row] === after.numbers[row]) continue;
      const [was, is] = [cellAt(before, row), cellAt(after, row)];
      if (!sameValue(was, is) && !(pair.units && isRounding(was, is))) visit(from + row, was, is, sigma(row));
    }
  }
}

/** A value that was converted to another unit and back differs in its last bits. */
function isRounding(was: Cell, is: Cell): boolean {
  return typeof was === "number" && typeof is === "number" && Math.abs(is - was) <= 8 * Number.EPSILON * Math.abs(was);
}

/** Visits all cells of a column in both states. */
export function eachPair(
  states: TwoStates,
  pair: ColumnPair<BookColumn>,
  visit: (at: number, before: Cell, after: Cell) => void,
): void {
  for (const { from, before, after } of stretchesOf(states, pair)) {
    for (let row = 0; row < before.length; row++) visit(from + row, cellAt(before, row), cellAt(after, row));
  }
}

function* stretchesOf(states: TwoStates, { from: old, to: now, units }: ColumnPair<BookColumn>): Generator<Stretch> {
  const { before, after, rows } = states;
  const size = rows?.length ?? Math.max(before.rows, after.rows);
  for (let from = 0; from < size; ) {
    // Edges where the chunks of the sheet have theirs.
    const to = Math.min(size, (Math.floor((from + before.firstRow) / chunkRows) + 1) * chunkRows - before.firstRow);
    const read = (table: BookTable, column: number, side: "from" | "to"): Column =>
      rows ? gathered(table, column, rows.slice(from, to), side) : tableCells(table, column, from, to);
    const was = read(before, old.column, "from");
    const is = read(after, now.column, "to");
    const sigmas = [old.sigmas[0], now.sigmas[0]];
    const wasSigma = sigmas[0] === undefined ? undefined : read(before, sigmas[0], "from");
    const isSigma = sigmas[1] === undefined ? undefined : read(after, sigmas[1], "to");
    const isSigmaHere = isSigma && units ? convertSigmas(isSigma, is, units.to, units.from) : isSigma;
    yield {
      from,
      before: was,
      after: units ? convertColumn(is, units.to, units.from) : is,
      sigma: (row) => Math.abs(wasSigma?.numbers[row] || isSigmaHere?.numbers[row] || 0) || undefined,
    };
    from = to;
  }
}

function gathered(
  { book, sheet, firstRow }: BookTable,
  column: number,
  rows: readonly RowPair[],
  side: "from" | "to",
): Column {
  return columnOf(
    rows.map((pair): Cell => {
      const row = pair[side];
      return row === undefined ? null : cellOf(book, { sheet, column, row: firstRow + row });
    }),
  );
}
