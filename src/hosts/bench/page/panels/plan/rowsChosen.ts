import type { Page } from "../../page.js";

export interface RowsChosen {
  readonly rows: readonly number[];
  /** All of them, of which `rows` are the first. */
  readonly count: number;
  readonly are: "marked" | "selected";
}

/** The rows that a brush marked, without these the selected ones that are in view; the first so many of them. */
export async function rowsChosen(page: Page, most: number): Promise<RowsChosen> {
  const marked = [...page.marked()].filter((row) => row > 0).sort((a, b) => a - b);
  if (marked.length > 0) return { rows: marked.slice(0, most), count: marked.length, are: "marked" };
  const { area } = page.selection();
  const [from, to] = [Math.max(1, area.top), Math.min(area.bottom, page.sheetState().rows - 1)];
  const visible = await page.bench.visibleRows(page.sheet());
  if (!visible) {
    const count = Math.max(0, to - from + 1);
    const rows = Array.from({ length: Math.min(most, count) }, (_, index) => from + index);
    return { rows, count, are: "selected" };
  }
  const rows = [...visible].filter((row) => row >= from && row <= to);
  return { rows: rows.slice(0, most), count: rows.length, are: "selected" };
}
