import type { Outcome } from "../../protocol/request.js";
import type { Page } from "../page.js";

/** Of the rows seen, leaves those in view that a brush in a plot marked, or else those selected. */
export async function showOnly(page: Page): Promise<Outcome> {
  const sheet = page.sheet();
  const { rows, filter } = page.sheetState();
  const { top, bottom } = page.selection().area;
  const marked = page.marked();
  const seen = (await page.bench.visibleRows(sheet)) ?? Int32Array.from({ length: rows }, (_, row) => row);
  const isWanted = marked.size > 0 ? (row: number) => marked.has(row) : (row: number) => row >= top && row <= bottom;
  return page.bench.filter(
    sheet,
    filter,
    seen.filter((row) => row > 0 && isWanted(row)),
  );
}
