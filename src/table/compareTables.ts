import { type Cell, CellError } from "../call/cell.js";
import { type Column, cellAt } from "../call/column.js";

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
  readonly after: Cell;
  /** After less before, where both are numbers. */
  readonly change: number | undefined;
  /** The change as a part of the value before; undefined where that is 0. */
  readonly relative: number | undefined;
  /** The change in units of the uncertainty before, or else after. */
  readonly sigmas: number | undefined;
}

/**
 * What moved between two states of a table, the most important first: cells that became or ceased to be errors or
 * blanks, then by size in units of the uncertainty, then by relative size.
 */
export function compareTables(before: ComparedTable, after: ComparedTable): readonly Movement[] {
  const rows = matchRows(before.keys, after.keys);
  const movements: Movement[] = [];
  for (const column of before.columns) {
    const other = after.columns.find(({ header }) => header === column.header);
    if (!other) continue;
    for (const { key, from, to } of rows) {
      const old = from === undefined ? null : cellAt(column.column, from);
      const now = to === undefined ? null : cellAt(other.column, to);
      if (same(old, now)) continue;
      const sigma = sigmaAt(column, from) ?? sigmaAt(other, to);
      movements.push({
        header: column.header,
        key,
        rowBefore: from,
        rowAfter: to,
        before: old,
        after: now,
        ...sizes(old, now, sigma),
      });
    }
  }
  return movements.sort(byImportance);
}

function matchRows(before: readonly string[], after: readonly string[]) {
  const waiting = new Map<string, number[]>();
  after.forEach((key, row) => {
    const rows = waiting.get(key);
    if (rows) rows.push(row);
    else waiting.set(key, [row]);
  });
  const matched: { key: string; from: number | undefined; to: number | undefined }[] = before.map((key, from) => ({
    key,
    from,
    to: waiting.get(key)?.shift(),
  }));
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
