import type { Cell } from "../../call/cell.js";
import { readNumber } from "../cell/readNumber.js";

/** What a file declares the cells of a column to be. */
export type DeclaredType = "number" | "integer" | "logical" | "text";

/** Decimal numbers as programs write them; an exponent may be headed by the D of FORTRAN. */
const decimal = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eEdD][+-]?\d+)?$/;
const logicals: Readonly<Record<string, boolean>> = { true: true, t: true, 1: true, false: false, f: false, 0: false };

/**
 * A field of a column whose type the file declares: a declared text is never a number, a declared number always is one
 * where it can be. nan and blanks are blank; what is not as declared stays as text, and so does an integer that a
 * double would round.
 */
export function declaredCell(type: DeclaredType, field: string): Cell {
  if (type === "text") return field === "" ? null : field;
  const text = field.trim();
  if (text === "") return null;
  if (type === "logical") {
    const key = text.toLowerCase();
    return Object.hasOwn(logicals, key) ? logicals[key]! : text === "?" ? null : text;
  }
  const number = readNumber(text) ?? (decimal.test(text) ? Number(text.replace(/[dD]/, "e")) : undefined);
  if (number === undefined) return /^[+-]?nan$/i.test(text) ? null : text;
  if (type === "integer") return Number.isSafeInteger(number) ? number : text;
  return Number.isFinite(number) ? number : text;
}
