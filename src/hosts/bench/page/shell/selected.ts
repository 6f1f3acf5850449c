import type { Page } from "../page.js";

/** Columns of the selection, from left to right. */
export function selectedColumns(page: Page): number[] {
  const { left, right } = page.selection().area;
  return Array.from({ length: right - left + 1 }, (_, index) => left + index);
}

/** The words of a column's header, or its letter's place where it has none. */
export function headerOf(page: Page, column: number): string {
  const state = page.sheetState().columnStates[column];
  return state?.name || `column ${columnLetter(column)}`;
}

export function columnLetter(column: number): string {
  let letters = "";
  for (let rest = column; rest >= 0; rest = Math.floor(rest / 26) - 1) {
    letters = String.fromCharCode(65 + (rest % 26)) + letters;
  }
  return letters;
}
