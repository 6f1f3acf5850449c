import type { Area } from "../../../../../sheet/book/book.js";
import type { Page } from "../../page.js";

export type Toward = "down" | "up" | "right" | "left";

/** The first row of the selection over its others; a single row takes the one above it. */
export function fillDown(page: Page): void {
  const { area } = page.selection();
  const isOneRow = area.top === area.bottom;
  if (isOneRow && area.top === 0) return;
  void page.act({ do: "fill over", area: isOneRow ? { ...area, top: area.top - 1 } : area });
}

/** The first column of the selection over its others; a single column takes the one to its left. */
export function fillRight(page: Page): void {
  const { area } = page.selection();
  const isOneColumn = area.left === area.right;
  if (isOneColumn && area.left === 0) return;
  const left = isOneColumn ? area.left - 1 : area.left;
  const count = area.right - left;
  void page.act({ do: "fill", area: { ...area, left, right: left }, toward: "right", count, series: false });
}

/** Lines of two and more continue as a series, one line is repeated; `other` swaps that. */
export function isSeries(area: Area, toward: Toward, other: boolean): boolean {
  const lines = toward === "down" || toward === "up" ? area.bottom - area.top + 1 : area.right - area.left + 1;
  return lines > 1 !== other;
}
