import type { ColumnWidths } from "../keys/columnWidths.js";
import type { Sight } from "../layout/sight.js";
import type { At, Gesture } from "./gesture.js";

/** The edge of a letter dragged sets the width of its column, or of all whole columns selected with it. */
export function widthPress(start: At, column: number, sight: Sight, widths: ColumnWidths): Gesture {
  const before = sight.columns.widthOf(column);
  return {
    scrolls: "no",
    move: ({ x }) => widths.draft(column, (before + x - start.x) / sight.zoom),
    end: () => widths.enter(),
    cancel: () => widths.drop(),
  };
}
