import type { Cell } from "../call/cell.js";
import { type Column, cellAt } from "../call/column.js";
import { byImportance, type Change, changeOf, sameValue } from "./changeOf.js";
import { convertColumn, convertSigmas } from "./convertColumn.js";
import { matchRows, type RowPair } from "./matchRows.js";
import { type ColumnPair, pairColumns } from "./pairColumns.js";

/** A column as it stood at one moment; `sigma` is the column of its uncertainties, where it has one. */
export interface ComparedColumn {
  readonly header: string;
  readonly column: Column;
  readonly sigma?: Column;
}

export interface ComparedTable {
  /** What names each row, the same before and after; rows that share a name are taken in order. */
  readonly keys: readonly string[];
  readonly columns: readonly ComparedColumn[];
}

/** One cell that moved. */
export interface Movement extends Change {
  readonly header: string;
  readonly key: string;
  /** The row before and after; undefined where the row is not there. */
  readonly rowBefore: number | undefined;
  readonly rowAfter: number | undefined;
  readonly before: Cell;
  /** In the unit of the value before. */
  readonly after: Cell;
}

export interface Comparison {
  /**
   * The most important first: cells that became or ceased to be errors or blanks, then by size in units of the
   * uncertainty, then by relative size.
   */
  readonly movements: readonly Movement[];
  /** Headers of columns that are there in one of the states only, and so were not compared. */
  readonly onlyBefore: readonly string[];
  readonly onlyAfter: readonly string[];
}

/**
 * What moved between two states of a table. Columns belong together by their header; one whose unit was changed there
 * is found by its name and compared in the unit it had.
 */
export function compareTables(before: ComparedTable, after: ComparedTable): Comparison {
  const rows = matchRows(before.keys, after.keys);
  const pairs = pairColumns(before.columns, after.columns).map(inOneUnit);
  const movements = pairs.flatMap((pair) => movementsOf(pair, rows));
  const paired = new Set(pairs.map(({ to }) => to.header));
  const kept = new Set(pairs.map(({ from }) => from.header));
  return {
    movements: movements.sort(byImportance),
    onlyBefore: before.columns.map(({ header }) => header).filter((header) => !kept.has(header)),
    onlyAfter: after.columns.map(({ header }) => header).filter((header) => !paired.has(header)),
  };
}

function movementsOf({ from, to }: ColumnPair<ComparedColumn>, rows: readonly RowPair[]): Movement[] {
  return rows.flatMap((row) => {
    const before = row.from === undefined ? null : cellAt(from.column, row.from);
    const after = row.to === undefined ? null : cellAt(to.column, row.to);
    if (sameValue(before, after)) return [];
    const sigma = sigmaAt(from, row.from) ?? sigmaAt(to, row.to);
    const { key, from: rowBefore, to: rowAfter } = row;
    return { header: from.header, key, rowBefore, rowAfter, before, after, ...changeOf(before, after, sigma) };
  });
}

/** The column after in the unit of the one before. */
function inOneUnit({ from, to, units }: ColumnPair<ComparedColumn>): ColumnPair<ComparedColumn> {
  if (!units) return { from, to, units };
  const column = convertColumn(to.column, units.to, units.from);
  const sigma = to.sigma && { sigma: convertSigmas(to.sigma, to.column, units.to, units.from) };
  return { from, to: { ...to, column, ...sigma }, units };
}

function sigmaAt({ sigma }: ComparedColumn, row: number | undefined): number | undefined {
  const cell = sigma && row !== undefined ? cellAt(sigma, row) : null;
  return typeof cell === "number" && cell !== 0 ? Math.abs(cell) : undefined;
}
