import type { Area } from "../../../../../sheet/book/book.js";
import type { PaneName } from "../layout/frame.js";
import type { Box, Sight } from "../layout/sight.js";

/** So far beyond a pane an outline is not seen; boxes are cut there, as browsers draw no millions of pixels. */
const beyond = 40;

/** Where a pane lies in what is seen. */
export function paneBox(sight: Sight, name: PaneName): Box {
  const isHeader = name === "header" || name === "frozenHeader";
  const isFrozen = name === "frozenBody" || name === "frozenHeader";
  const left = isFrozen ? sight.numbersWidth : sight.freeLeft();
  const top = isHeader ? sight.lettersHeight : sight.bodyTop();
  return {
    left,
    top,
    width: isFrozen ? sight.columns.frozenWidth : Math.max(sight.width - left, 0),
    height: isHeader ? sight.headerHeight : Math.max(sight.height - top, 0),
  };
}

/**
 * The part of an area's box that belongs to a pane, from the pane's corner. An area that goes on in a neighbouring pane
 * gets its edge beyond this one. `hasEnd`: its last corner lies in this pane.
 */
export function cutToPane(
  sight: Sight,
  name: PaneName,
  area: Area,
  box: Box,
): (Box & { readonly hasEnd: boolean }) | undefined {
  const pane = paneBox(sight, name);
  const isHeader = name === "header" || name === "frozenHeader";
  const isFrozen = name === "frozenBody" || name === "frozenHeader";
  const { frozen } = sight.columns;
  if (isHeader ? area.top > 0 : area.bottom === 0) return undefined;
  if (isFrozen ? area.left >= frozen : area.right < frozen) return undefined;
  const goesOn = {
    up: !isHeader && area.top === 0,
    down: isHeader && area.bottom > 0,
    left: !isFrozen && area.left < frozen,
    right: isFrozen && area.right >= frozen,
  };
  const cut = (value: number, size: number) => Math.min(Math.max(value, -beyond), size + beyond);
  const left = goesOn.left ? -beyond : cut(box.left - pane.left, pane.width);
  const top = goesOn.up ? -beyond : cut(box.top - pane.top, pane.height);
  const right = goesOn.right ? pane.width + beyond : cut(box.left + box.width - pane.left, pane.width);
  const bottom = goesOn.down ? pane.height + beyond : cut(box.top + box.height - pane.top, pane.height);
  if (right <= 0 || bottom <= 0 || left >= pane.width || top >= pane.height) return undefined;
  return { left, top, width: right - left, height: bottom - top, hasEnd: !goesOn.right && !goesOn.down };
}
