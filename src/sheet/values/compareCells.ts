import type { CellError } from "../../call/cell.js";

/** A cell that is no error. */
export type PlainCell = number | string | boolean | null;

export function isPlain(cell: PlainCell | CellError): cell is PlainCell {
  return typeof cell !== "object" || cell === null;
}

/**
 * The order of worksheet values (ISO/IEC 26300-3 section 6.4.9): numbers before texts before logicals; texts without
 * regard to case. A blank takes the kind of the other side: 0, "" or FALSE.
 */
export function compareCells(left: PlainCell, right: PlainCell): number {
  const a = left ?? blankLike(right);
  const b = right ?? blankLike(left);
  if (typeof a === "number" && typeof b === "number") {
    return a < b ? -1 : a > b ? 1 : 0;
  }
  if (typeof a === "string" && typeof b === "string") {
    return compareTexts(a, b);
  }
  if (typeof a === "boolean" && typeof b === "boolean") {
    return Number(a) - Number(b);
  }
  return rank(a) - rank(b);
}

/**
 * Texts in the order of their letters, capital or not: the same on every machine, so by code points and not by the
 * rules of one country.
 */
export function compareTexts(left: string, right: string): number {
  if (left === right) {
    return 0;
  }
  const a = foldCase(left);
  const b = foldCase(right);
  return a < b ? -1 : a > b ? 1 : 0;
}

export function foldCase(text: string): string {
  return text.toLowerCase();
}

function blankLike(other: PlainCell): number | string | boolean {
  return typeof other === "string" ? "" : typeof other === "boolean" ? false : 0;
}

function rank(value: number | string | boolean): number {
  return typeof value === "number" ? 0 : typeof value === "string" ? 1 : 2;
}
