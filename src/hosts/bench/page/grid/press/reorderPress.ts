import type { Page } from "../../page.js";
import type { Sight } from "../layout/sight.js";
import type { Marks } from "../paint/marks.js";
import type { Selecting } from "../select/selecting.js";
import type { At, Gesture } from "./gesture.js";

const leastMove = 5;

/** A selected letter dragged, or any with Alt, puts its columns elsewhere; a mark shows where. */
export function reorderPress(
  start: At,
  page: Page,
  sight: Sight,
  marks: Marks,
  selecting: Selecting,
  request: () => void,
): Gesture {
  const { area } = page.selection();
  const isInside = start.column >= area.left && start.column <= area.right;
  const [from, to] = isInside ? [area.left, area.right] : [start.column, start.column];
  let before: number | undefined;
  let isMoving = false;
  const show = (next: number | undefined) => {
    before = next;
    marks.dropBefore = next;
    request();
  };
  return {
    scrolls: "across",
    move(at) {
      isMoving ||= Math.abs(at.x - start.x) >= leastMove;
      if (!isMoving) return;
      const box = sight.boxOf({ row: 0, column: at.column });
      const next = at.x > box.left + box.width / 2 ? at.column + 1 : at.column;
      show(next < from || next > to + 1 ? next : undefined);
    },
    end() {
      const wanted = before;
      show(undefined);
      if (!isMoving) return selecting.columns(start.column, start.column);
      if (wanted === undefined) return;
      void page.act({ do: "reorder columns", sheet: page.sheet(), from, count: to - from + 1, before: wanted });
    },
    cancel: () => show(undefined),
  };
}
