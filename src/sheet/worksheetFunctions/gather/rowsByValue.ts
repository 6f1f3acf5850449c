import type { Column } from "../../../call/column.js";
import { cellAt } from "../../../call/column.js";
import { foldCase } from "../../values/compareCells.js";

/** A value as it is compared: texts without regard to case, both zeros alike. */
export type Key = number | string | boolean;

/** The rows of every value of a column. Columns never change, so what was built once holds. */
const indexes = new WeakMap<Column, Map<Key, number[]>>();
/** Columns that were searched once: the second search builds the index, so that one search alone stays a scan. */
const searched = new WeakSet<Column>();
const worthAnIndex = 64;
const noRows: readonly number[] = [];

/** The rows that hold a value, in their order; undefined where looking through the column is as good. */
export function rowsByValue(column: Column, key: Key): readonly number[] | undefined {
  if (column.length < worthAnIndex) return undefined;
  const known = indexes.get(column);
  if (known) return known.get(keyOf(key)) ?? noRows;
  if (!searched.has(column)) {
    searched.add(column);
    return undefined;
  }
  const index = new Map<Key, number[]>();
  for (let row = 0; row < column.length; row++) {
    const cell = cellAt(column, row);
    if (typeof cell === "object") continue;
    const rows = index.get(keyOf(cell));
    if (rows) rows.push(row);
    else index.set(keyOf(cell), [row]);
  }
  indexes.set(column, index);
  return index.get(keyOf(key)) ?? noRows;
}

export function keyOf(value: Key): Key {
  return typeof value === "string" ? foldCase(value) : value === 0 ? 0 : value;
}
