import type { Cell } from "../../call/cell.js";
import { fieldOfCell } from "../cell/fieldOfCell.js";

/**
 * Changes a text before it is written, for example so that a program that opens the file does not take it for a
 * formula. It sees texts of cells, headers and units that are written anew, never what a read file holds.
 */
export type GuardText = (text: string) => string;

/** A field in quotes where RFC 4180 (section 2, rules 5 to 7) asks for them or where another delimiter would be guessed. */
export function quoteField(text: string): string {
  return /[",\t;|\r\n]|^\s|\s$/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/** A field at the beginning of a line, where a comment or a byte order mark could begin too. */
export function quoteFirstField(text: string): string {
  return /^[#\uFEFF]/.test(text) && quoteField(text) === text ? `"${text}"` : quoteField(text);
}

/** A cell as a field, before quoting. */
export function guardedField(cell: Cell, guardText: GuardText | undefined): string {
  return typeof cell === "string" && guardText !== undefined ? guardText(cell) : fieldOfCell(cell);
}

/** A cell as a field in quotes where it needs them; a number never does, and most cells are numbers. */
export function quotedCell(cell: Cell, guardText: GuardText | undefined): string {
  const field = guardedField(cell, guardText);
  return typeof cell === "number" ? field : quoteField(field);
}
