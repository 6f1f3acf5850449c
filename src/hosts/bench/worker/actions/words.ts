import { columnLetters } from "../../../../sheet/book/address.js";
import type { Area, Book } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { recogniseColumn } from "../../../../table/recogniseColumn.js";

const longestName = 40;

export function headerText(book: Book, sheet: number, column: number): string {
  const header = cellOf(book, { sheet, row: 0, column });
  return typeof header === "string" || typeof header === "number" ? String(header) : "";
}

/** What an analyst calls a column: its header without the unit, or its letter. */
export function columnName(book: Book, sheet: number, column: number): string {
  const name = recogniseColumn(headerText(book, sheet, column)).name;
  if (name === "") return `column ${columnLetters(column)}`;
  return name.length > longestName ? `${name.slice(0, longestName - 1)}…` : name;
}

export function columnNames(book: Book, sheet: number, left: number, right: number): string {
  return left === right ? columnName(book, sheet, left) : `${counted(right - left + 1, "column")}`;
}

export function counted(count: number, noun: string): string {
  return `${count.toLocaleString("en")} ${noun}${count === 1 ? "" : "s"}`;
}

/** "row 12" or "60 rows". */
export function rowsText(top: number, rows: number): string {
  return rows === 1 ? `row ${top + 1}` : counted(rows, "row");
}

/** "Star mass in 60 rows", "3 columns in row 12". */
export function areaWords(book: Book, { sheet, left, right, top }: Area, rows: number): string {
  return `${columnNames(book, sheet, left, right)} in ${rowsText(top, rows)}`;
}
