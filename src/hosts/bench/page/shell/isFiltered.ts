import type { Page } from "../page.js";

/** Whether rows are kept from view: by conditions, or because others were chosen by hand. */
export function isFiltered(page: Page): boolean {
  const { filter, rows, visibleRows } = page.sheetState();
  return filter.length > 0 || visibleRows < rows;
}
