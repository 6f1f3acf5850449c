import type { Page } from "../../page.js";
import { narrowest, widest } from "../layout/columnWidth.js";
import type { Frame } from "../layout/frame.js";
import type { Sight } from "../layout/sight.js";
import { columnFit } from "../paint/columnFit.js";
import { isWholeColumns } from "../select/areas.js";

const step = 8;
const rest = 500;

/** Widths by keyboard and by the edge; a row of key presses becomes one action. */
export interface ColumnWidths {
  /** Shown at once, and set for good with `enter`. */
  draft(column: number, width: number): void;
  enter(): void;
  drop(): void;
  widen(steps: number): void;
  fit(columns: readonly number[]): void;
  /** The columns that a change of one of them is for. */
  together(column: number): readonly number[];
}

export function createColumnWidths(page: Page, frame: Frame, sight: Sight, changed: () => void): ColumnWidths {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const { draftWidths } = sight;

  function together(column: number): readonly number[] {
    const { area } = page.selection();
    if (!isWholeColumns(area) || column < area.left || column > area.right) return [column];
    const right = Math.min(area.right, sight.columns.count - 1);
    const all = Array.from({ length: right - area.left + 1 }, (_, index) => area.left + index);
    return all.filter((each) => sight.columns.widthOf(each) > 0);
  }

  function draft(column: number, width: number): void {
    const kept = Math.round(Math.min(Math.max(width, narrowest), widest));
    for (const each of together(column)) draftWidths.set(each, kept);
    changed();
  }

  async function enter(): Promise<void> {
    clearTimeout(timer);
    const drafts = new Map(draftWidths);
    if (drafts.size === 0) return;
    const byWidth = new Map<number, number[]>();
    for (const [column, width] of drafts) byWidth.set(width, [...(byWidth.get(width) ?? []), column]);
    for (const [width, columns] of byWidth) await page.act({ do: "width", sheet: page.sheet(), columns, width });
    for (const [column, width] of drafts) if (draftWidths.get(column) === width) draftWidths.delete(column);
    changed();
  }

  return {
    draft,
    enter: () => void enter(),
    drop() {
      draftWidths.clear();
      changed();
    },
    together,
    widen(steps) {
      const { column } = page.selection().active;
      const width = draftWidths.get(column) ?? sight.columns.widthOf(column) / sight.zoom;
      draft(column, width + steps * step);
      clearTimeout(timer);
      timer = setTimeout(enter, rest);
    },
    fit(columns) {
      for (const column of columns) draftWidths.set(column, columnFit(page, frame, sight, column));
      changed();
      void enter();
    },
  };
}
