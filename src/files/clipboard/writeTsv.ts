import type { Cell } from "../../call/cell.js";
import { fieldOfCell } from "../cell/fieldOfCell.js";
import { guardFormula } from "../cell/guardFormula.js";

/**
 * Cells as the plain text of a clipboard, with every digit; quotes around what would be taken for two cells, an apostrophe
 * before a text that would be taken for a formula.
 */
export function writeTsv(rows: readonly (readonly Cell[])[]): string {
  return rows.map((row) => row.map(fieldOf).join("\t")).join("\r\n");
}

function fieldOf(cell: Cell): string {
  const field = typeof cell === "string" ? guardFormula(cell) : fieldOfCell(cell);
  return /[\t\r\n"]/.test(field) ? `"${field.replaceAll('"', '""')}"` : field;
}
