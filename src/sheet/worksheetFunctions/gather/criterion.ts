import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import { compareTexts, foldCase } from "../../values/compareCells.js";
import { numberFromText } from "../../values/numberFromText.js";
import { hasWildcards, wildcardExpression } from "./wildcard.js";

/** A condition on one cell. */
export type Condition = (cell: Cell) => boolean;

type Comparator = "=" | "<>" | "<" | "<=" | ">" | ">=";

/**
 * The condition that a criterion states (ISO/IEC 26300-3 section 4.11.8): a number, a logical or a text to equal, or
 * a comparator with one. Texts are compared whole, without regard to case, with ? and * as wildcards.
 */
export function conditionOf(criterion: Cell): Condition {
  if (typeof criterion === "string") {
    const parts = /^(<>|<=|>=|<|>|=)?(.*)$/s.exec(criterion) as RegExpExecArray;
    const comparator = parts[1] as Comparator | undefined;
    const operand = parts[2] as string;
    return comparator === undefined ? matchesText(operand) : compares(comparator, operand);
  }
  if (criterion instanceof CellError) {
    return (cell) => cell instanceof CellError && cell.code === criterion.code;
  }
  const wanted = criterion ?? 0;
  return (cell) => cell === wanted;
}

/** The one value that cells equal where a criterion holds; undefined for every other criterion. */
export function equalValue(criterion: Cell): number | boolean | string | undefined {
  if (criterion instanceof CellError) return undefined;
  if (typeof criterion !== "string") return criterion ?? 0;
  const operand = criterion.startsWith("=") ? criterion.slice(1) : criterion;
  if (operand === "" || (operand === criterion && /^[<>]/.test(criterion))) return undefined;
  const value = plainValue(operand);
  return typeof value === "string" && hasWildcards(value) ? undefined : value;
}

function matchesText(operand: string): Condition {
  // A criterion that is an empty text finds what looks empty.
  return operand === "" ? (cell) => cell === null || cell === "" : equals(operand);
}

function compares(comparator: Comparator, operand: string): Condition {
  if (comparator === "=") {
    return operand === "" ? (cell) => cell === null : equals(operand);
  }
  if (comparator === "<>") {
    if (operand === "") {
      return (cell) => cell !== null;
    }
    const same = equals(operand);
    return (cell) => !same(cell);
  }
  return ordered(comparator, operand);
}

function equals(operand: string): Condition {
  const wanted = plainValue(operand);
  if (typeof wanted !== "string") {
    return (cell) => cell === wanted;
  }
  if (hasWildcards(wanted)) {
    const expression = wildcardExpression(wanted, "whole");
    return (cell) => typeof cell === "string" && expression.test(cell);
  }
  const folded = foldCase(wanted);
  return (cell) => typeof cell === "string" && foldCase(cell) === folded;
}

function ordered(comparator: "<" | "<=" | ">" | ">=", operand: string): Condition {
  const wanted = plainValue(operand);
  const holds = {
    "<": (order: number) => order < 0,
    "<=": (order: number) => order <= 0,
    ">": (order: number) => order > 0,
    ">=": (order: number) => order >= 0,
  }[comparator];
  if (typeof wanted === "number") {
    return (cell) => typeof cell === "number" && holds(cell - wanted);
  }
  if (typeof wanted === "boolean") {
    return (cell) => typeof cell === "boolean" && holds(Number(cell) - Number(wanted));
  }
  return (cell) => typeof cell === "string" && holds(compareTexts(cell, wanted));
}

function plainValue(operand: string): number | boolean | string {
  const word = operand.toUpperCase();
  return word === "TRUE" ? true : word === "FALSE" ? false : (numberFromText(operand) ?? operand);
}
