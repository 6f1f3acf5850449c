import { columnLetters } from "../../../../sheet/book/address.js";
import type { Page } from "../page.js";

/** Columns of the selection, from left to right. */
export function selectedColumns(page: Page): number[] {
  const { left, right } = page.selection().area;
  return Array.from({ length: right - left + 1 }, (_, index) => left + index);
}

/** The words of a column's header, or its letter's place where it has none. */
export function headerOf(page: Page, column: number): string {
  const state = page.sheetState().columnStates[column];
  return state?.name || `column ${columnLetters(column)}`;
}
