import type { Frame } from "./frame.js";
import type { Sight, Spot } from "./sight.js";

/** Where a cell is in the window; undefined where it is hidden, scrolled away or under what is frozen. */
export function screenBox(frame: Frame, sight: Sight, spot: Spot): DOMRect | undefined {
  const { left, top, width, height } = sight.boxOf(spot);
  const leftEdge = spot.column < sight.columns.frozen ? sight.numbersWidth : sight.freeLeft();
  const topEdge = spot.row <= 0 ? sight.lettersHeight : sight.bodyTop();
  const isOut = left + width <= leftEdge || top + height <= topEdge || left >= sight.width || top >= sight.height;
  if (isOut || width === 0) return undefined;
  const corner = frame.view.getBoundingClientRect();
  return new DOMRect(corner.left + left, corner.top + top, width, height);
}
