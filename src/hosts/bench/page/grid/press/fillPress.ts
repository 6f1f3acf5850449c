import type { Area } from "../../../../../sheet/book/book.js";
import type { Page } from "../../page.js";
import { isSeries, type Toward } from "../keys/filling.js";
import type { Marks } from "../paint/marks.js";
import type { Selecting } from "../select/selecting.js";
import type { Gesture } from "./gesture.js";

interface Reach {
  readonly toward: Toward;
  readonly count: number;
  readonly ghost: Area;
}

/** The fill handle dragged: the selection is repeated as far as the outline shows. Ctrl: a series, or none. */
export function fillPress(page: Page, marks: Marks, selecting: Selecting, request: () => void): Gesture {
  const { area } = page.selection();
  let reach: Reach | undefined;
  const show = (next: Reach | undefined) => {
    reach = next;
    marks.ghost = next?.ghost;
    request();
  };
  return {
    scrolls: "both",
    move: (at) => show(reachOf(area, selecting.placeOf(at))),
    end({ isOther }) {
      if (reach) {
        const { toward, count } = reach;
        void page.act({ do: "fill", area, toward, count, series: isSeries(area, toward, isOther) });
      }
      show(undefined);
    },
    cancel: () => show(undefined),
  };
}

/** The side on which a place lies farthest outside of an area. */
export function reachOf(
  area: Area,
  { row, column }: { readonly row: number; readonly column: number },
): Reach | undefined {
  const sides: readonly Reach[] = [
    { toward: "down", count: row - area.bottom, ghost: { ...area, top: area.bottom + 1, bottom: row } },
    { toward: "up", count: area.top - row, ghost: { ...area, top: row, bottom: area.top - 1 } },
    { toward: "right", count: column - area.right, ghost: { ...area, left: area.right + 1, right: column } },
    { toward: "left", count: area.left - column, ghost: { ...area, left: column, right: area.left - 1 } },
  ];
  const farthest = sides.reduce((best, side) => (side.count > best.count ? side : best));
  return farthest.count > 0 ? farthest : undefined;
}
