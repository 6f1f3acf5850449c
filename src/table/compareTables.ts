import { type Cell, CellError } from "../call/cell.js";
import { type Column, cellAt, columnOf } from "../call/column.js";
import { baseSlope, convertible, fromBase, toBase, type Unit } from "../units/unit.js";
import { recogniseColumn } from "./recogniseColumn.js";

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
export interface Movement {
  readonly header: string;
  readonly key: string;
  /** The row before and after; undefined where the row is not there. */
  readonly rowBefore: number | undefined;
  readonly rowAfter: number | undefined;
  readonly before: Cell;
  /** In the unit of the value before. */
  readonly after: Cell;
  /** After less before, where both are numbers. */
  readonly change: number | undefined;
  /** The change as a part of the value before; undefined where that is 0. */
  readonly relative: number | undefined;
  /** The change in units of the uncertainty before, or else after. */
  readonly sigmas: number | undefined;
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
  const pairs = matchColumns(before.columns, after.columns);
  const movements = pairs.flatMap(({ from, to }) => movementsOf(from, to, rows));
  const paired = new Set(pairs.map(({ to }) => to.header));
  const kept = new Set(pairs.map(({ from }) => from.header));
  return {
    movements: movements.sort(byImportance),
    onlyBefore: before.columns.map(({ header }) => header).filter((header) => !kept.has(header)),
    onlyAfter: after.columns.map(({ header }) => header).filter((header) => !paired.has(header)),
  };
}

interface RowPair {
  readonly key: string;
  readonly from: number | undefined;
  readonly to: number | undefined;
}

interface ColumnPair {
  readonly from: ComparedColumn;
  /** Its header is the one it has now, its cells are in the unit of `from`. */
  readonly to: ComparedColumn;
}

function movementsOf(from: ComparedColumn, to: ComparedColumn, rows: readonly RowPair[]): Movement[] {
  return rows.flatMap((row) => {
    const before = row.from === undefined ? null : cellAt(from.column, row.from);
    const after = row.to === undefined ? null : cellAt(to.column, row.to);
    if (same(before, after)) return [];
    const sigma = sigmaAt(from, row.from) ?? sigmaAt(to, row.to);
    const { key, from: rowBefore, to: rowAfter } = row;
    return { header: from.header, key, rowBefore, rowAfter, before, after, ...sizes(before, after, sigma) };
  });
}

function matchColumns(before: readonly ComparedColumn[], after: readonly ComparedColumn[]): ColumnPair[] {
  const left = [...after];
  const take = (matches: (column: ComparedColumn) => boolean) => {
    const at = left.findIndex(matches);
    return at < 0 ? undefined : left.splice(at, 1)[0];
  };
  const exact = before.map((from) => ({ from, to: take(({ header }) => header === from.header) }));
  return exact.flatMap(({ from, to }): ColumnPair[] => {
    if (to) return [{ from, to }];
    const was = recogniseColumn(from.header);
    const renamed = take(({ header }) => {
      const now = recogniseColumn(header);
      return now.name === was.name && !!now.unit && !!was.unit && convertible(now.unit, was.unit);
    });
    if (!renamed) return [];
    return [{ from, to: converted(renamed, recogniseColumn(renamed.header).unit!, was.unit!) }];
  });
}

function converted({ header, column, sigma }: ComparedColumn, from: Unit, to: Unit): ComparedColumn {
  const values = Array.from({ length: column.length }, (_, row): Cell => {
    const cell = cellAt(column, row);
    return typeof cell === "number" ? fromBase(to, toBase(from, cell)) : cell;
  });
  if (!sigma) return { header, column: columnOf(values) };
  const sigmas = Array.from({ length: sigma.length }, (_, row): Cell => {
    const [cell, value] = [cellAt(sigma, row), cellAt(column, row)];
    if (typeof cell !== "number" || typeof value !== "number") return cell;
    const base = toBase(from, value);
    return (cell * baseSlope(from, base)) / baseSlope(to, base);
  });
  return { header, column: columnOf(values), sigma: columnOf(sigmas) };
}

function matchRows(before: readonly string[], after: readonly string[]): RowPair[] {
  const waiting = new Map<string, number[]>();
  after.forEach((key, row) => {
    const rows = waiting.get(key);
    if (rows) rows.push(row);
    else waiting.set(key, [row]);
  });
  const matched: RowPair[] = before.map((key, from) => ({ key, from, to: waiting.get(key)?.shift() }));
  for (const [key, rows] of waiting) for (const to of rows) matched.push({ key, from: undefined, to });
  return matched;
}

function same(before: Cell, after: Cell): boolean {
  if (before instanceof CellError && after instanceof CellError) {
    return before.code === after.code && before.message === after.message;
  }
  return before === after;
}

function sigmaAt({ sigma }: ComparedColumn, row: number | undefined): number | undefined {
  const cell = sigma && row !== undefined ? cellAt(sigma, row) : null;
  return typeof cell === "number" && cell !== 0 ? Math.abs(cell) : undefined;
}

function sizes(before: Cell, after: Cell, sigma: number | undefined) {
  if (typeof before !== "number" || typeof after !== "number")
    return { change: undefined, relative: undefined, sigmas: undefined };
  const change = after - before;
  return {
    change,
    relative: before === 0 ? undefined : change / Math.abs(before),
    sigmas: sigma === undefined ? undefined : change / sigma,
  };
}

function byImportance(a: Movement, b: Movement): number {
  const kind = (movement: Movement) => (movement.change === undefined ? 0 : 1);
  const size = (value: number | undefined) => Math.abs(value ?? 0);
  return kind(a) - kind(b) || size(b.sigmas) - size(a.sigmas) || size(b.relative) - size(a.relative);
}
