import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import type { Column } from "../../call/column.js";
import { cellAt } from "../../call/column.js";
import { compareCells } from "../values/compareCells.js";

export interface SortKey {
  readonly column: number;
  readonly descending?: boolean;
}

/**
 * The rows in sorted order: numbers, texts, logicals, then errors; blanks last whichever way. Equal rows keep their
 * order.
 */
export function orderRows(keys: readonly SortKey[], columns: readonly Column[]): Int32Array {
  const count = columns[0]?.length ?? 0;
  let order: Int32Array = Int32Array.from({ length: count }, (_, row) => row);
  // By the last key first: a sort that keeps equal rows in order keeps what the later keys have ordered.
  for (let index = keys.length - 1; index >= 0; index--) {
    order = orderBy(order, columns[index] as Column, keys[index]?.descending ?? false);
  }
  return order;
}

function orderBy(order: Int32Array, column: Column, descending: boolean): Int32Array {
  const { numbers } = column;
  const numeric: number[] = [];
  const others: number[] = [];
  const blanks: number[] = [];
  for (const row of order) {
    const other = Number.isNaN(numbers[row] as number) ? column.others?.[row] : undefined;
    (other === undefined ? numeric : other === null ? blanks : others).push(row);
  }
  const sorted = sortNumeric(Int32Array.from(numeric), numbers, descending);
  const sign = descending ? -1 : 1;
  others.sort((a, b) => sign * compareOthers(cellAt(column, a), cellAt(column, b)));
  const parts = descending ? [others, sorted, blanks] : [sorted, others, blanks];
  const all = new Int32Array(order.length);
  let at = 0;
  for (const part of parts) {
    all.set(part, at);
    at += part.length;
  }
  return all;
}

function compareOthers(left: Cell, right: Cell): number {
  if (left instanceof CellError || right instanceof CellError) {
    return Number(left instanceof CellError) - Number(right instanceof CellError);
  }
  return compareCells(left, right);
}

/** Merge sort of rows by their numbers, from the bottom up, with the numbers carried along. */
function sortNumeric(rows: Int32Array, numbers: Float64Array, descending: boolean): Int32Array {
  const count = rows.length;
  let from: Keyed = { rows, keys: Float64Array.from(rows, (row) => (descending ? -1 : 1) * (numbers[row] as number)) };
  let to: Keyed = { rows: new Int32Array(count), keys: new Float64Array(count) };
  for (let width = 1; width < count; width *= 2) {
    for (let start = 0; start < count; start += 2 * width) {
      mergeHalves(from, to, start, Math.min(start + width, count), Math.min(start + 2 * width, count));
    }
    [from, to] = [to, from];
  }
  return from.rows;
}

interface Keyed {
  readonly rows: Int32Array;
  readonly keys: Float64Array;
}

function mergeHalves(from: Keyed, to: Keyed, start: number, middle: number, end: number): void {
  let left = start;
  let right = middle;
  for (let at = start; at < end; at++) {
    const takeLeft = left < middle && (right >= end || (from.keys[left] as number) <= (from.keys[right] as number));
    const source = takeLeft ? left++ : right++;
    to.keys[at] = from.keys[source] as number;
    to.rows[at] = from.rows[source] as number;
  }
}
