import type { Outcome } from "../../protocol/request.js";
import type { Page } from "../page.js";

/** Leaves in view the rows that a brush in a plot marked, or else those selected, of the rows that the filter lets through. */
export function showOnly(page: Page): Promise<Outcome> {
  const { rows, filter } = page.sheetState();
  const { top, bottom } = page.selection().area;
  const selected = () => {
    const from = Math.max(1, top);
    return Array.from({ length: Math.max(0, Math.min(bottom, rows - 1) - from + 1) }, (_, index) => from + index);
  };
  const marked = [...page.marked()];
  return page.bench.filter(page.sheet(), filter, Int32Array.from(marked.length > 0 ? marked : selected()).sort());
}
