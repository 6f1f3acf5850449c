import type { PlainCell } from "../../values/compareCells.js";
import { foldCase } from "../../values/compareCells.js";
import { keyOf, rowsByValue } from "../gather/rowsByValue.js";
import { hasWildcards, wildcardExpression } from "../gather/wildcard.js";
import type { Vector } from "./vector.js";

/** The first place whose cell equals the value, texts without regard to case; -1 where there is none. */
export function exactPlace(vector: Vector, wanted: Exclude<PlainCell, null>): number {
  const rows = vector.column && rowsByValue(vector.column, wanted);
  if (rows) {
    return rows[0] ?? -1;
  }
  const key = keyOf(wanted);
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
