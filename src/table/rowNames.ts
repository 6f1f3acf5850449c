import { type Cell, CellError } from "../call/cell.js";
import type { Column } from "../call/column.js";

/** The column whose texts name the rows: the first that is mostly text; undefined where there is none. */
export function nameColumn<C extends { readonly column: Column }>(columns: readonly C[], rows: number): C | undefined {
  return columns.find(({ column }) => isMostlyText(column, rows));
}

export function isMostlyText({ others }: Column, rows: number): boolean {
  const texts = (others ?? []).filter((cell) => typeof cell === "string" && cell.trim() !== "");
  return 2 * texts.length > rows;
}

/** What names a row: the text of a cell, or the number of the row where it is blank. */
export function rowName(cell: Cell, rowNumber: number): string {
  const name = nameOf(cell);
  return name === "" ? `row ${rowNumber}` : name;
}

/** A cell as the name of its row; empty where it names none. */
export function nameOf(cell: Cell): string {
  return cell === null ? "" : cell instanceof CellError ? cell.code : String(cell).trim();
}
