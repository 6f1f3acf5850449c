import type { Cell } from "../../../src/call/cell.js";
import { cellAt } from "../../../src/call/column.js";
import type { DelimitedOptions } from "../../../src/files/delimited/delimitedReader.js";
import type { DelimitedTable } from "../../../src/files/delimited/delimitedTable.js";
import { readDelimitedText } from "../../../src/files/delimited/readDelimited.js";

const units = new Set(["d", "m/s", "solMass", "1"]);

export const isUnit = (text: string): boolean => units.has(text);

export function read(text: string, options: Partial<DelimitedOptions> = {}): DelimitedTable {
  return readDelimitedText(text, { isUnit, ...options });
}

/** The data rows of a table, row by row. */
export function rowsOf(table: DelimitedTable): Cell[][] {
  return Array.from({ length: table.rows }, (_, row) => table.columns.map((column) => cellAt(column, row)));
}
