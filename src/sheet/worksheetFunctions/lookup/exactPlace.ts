import type { Column } from "../../../call/column.js";
import { cellAt } from "../../../call/column.js";
import type { PlainCell } from "../../values/compareCells.js";
import { foldCase } from "../../values/compareCells.js";
import { hasWildcards, wildcardExpression } from "../gather/wildcard.js";
import type { Vector } from "./vector.js";

type Key = number | string | boolean;

/** The first place of every value of a column. Columns never change, so what was built once holds. */
const indexes = new WeakMap<Column, Map<Key, number>>();
/** Columns that were searched once: the second search builds the index, so that one lookup alone stays a scan. */
const searched = new WeakSet<Column>();
const worthAnIndex = 64;

/** The first place whose cell equals the value, texts without regard to case; -1 where there is none. */
export function exactPlace(vector: Vector, wanted: Exclude<PlainCell, null>): number {
  const key = typeof wanted === "string" ? foldCase(wanted) : wanted;
  const { column } = vector;
  if (column && column.length >= worthAnIndex) {
    const index = indexOf(column);
    if (index) {
      return index.get(key === 0 ? 0 : key) ?? -1;
    }
  }
  return firstPlace(vector, 1, (cell) => (typeof cell === "string" ? foldCase(cell) : cell) === key);
}

/** The first place, forwards (1) or backwards (-1), whose cell passes; -1 where there is none. */
export function firstPlace(vector: Vector, step: 1 | -1, passes: (cell: unknown) => boolean): number {
  for (let index = step === 1 ? 0 : vector.length - 1; index >= 0 && index < vector.length; index += step) {
    if (passes(vector.at(index))) {
      return index;
    }
  }
  return -1;
}

/** A test for equality with a value in which ? and * stand for characters. */
export function wildcardTest(wanted: Exclude<PlainCell, null>): (cell: unknown) => boolean {
  if (typeof wanted === "string" && hasWildcards(wanted)) {
    const expression = wildcardExpression(wanted, "whole");
    return (cell) => typeof cell === "string" && expression.test(cell);
  }
  const key = typeof wanted === "string" ? foldCase(wanted) : wanted;
  return (cell) => (typeof cell === "string" ? foldCase(cell) : cell) === key;
}

function indexOf(column: Column): Map<Key, number> | undefined {
  const known = indexes.get(column);
  if (known || !searched.has(column)) {
    searched.add(column);
    return known;
  }
  const index = new Map<Key, number>();
  for (let row = column.length - 1; row >= 0; row--) {
    const cell = cellAt(column, row);
    if (typeof cell === "number" || typeof cell === "boolean") {
      index.set(cell === 0 ? 0 : cell, row);
    } else if (typeof cell === "string") {
      index.set(foldCase(cell), row);
    }
  }
  indexes.set(column, index);
  return index;
}
