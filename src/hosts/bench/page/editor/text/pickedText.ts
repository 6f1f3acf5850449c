import { stringifyA1Ref } from "@borgar/fx";
import type { Area, Place } from "../../../../../sheet/book/book.js";
import { mostColumns, mostRows } from "../../../../../sheet/limits.js";
import { readTokens } from "./tokens.js";

/**
 * Cells that were picked, as a reference in the formula of a place. Another sheet is named. A header row keeps its
 * `$`, because headers stay where they are when the formula is filled down.
 */
export function pickedText(area: Area, place: Place, sheets: readonly string[]): string {
  const { top, left, bottom, right } = area;
  const wholeRows = left === 0 && right >= mostColumns - 1;
  const wholeColumns = !wholeRows && top === 0 && bottom >= mostRows - 1;
  const header = !wholeRows && top === 0 && bottom === 0 && place.row > 0;
  const name = area.sheet === place.sheet ? undefined : sheets[area.sheet];
  return stringifyA1Ref({
    context: name === undefined ? [] : [name],
    range: {
      top: wholeColumns ? null : top,
      bottom: wholeColumns ? null : bottom,
      left: wholeRows ? null : left,
      right: wholeRows ? null : right,
      $top: header,
      $bottom: header,
      $left: false,
      $right: false,
    },
  });
}

/** Whether a reference may take the place of a selection: after an operator, "(" or ",", and not in front of a value. */
export function mayPick(text: string, from: number, to: number): boolean {
  const tokens = readTokens(text).filter((token) => token.kind !== "space");
  const inside = tokens.some((token) => token.from < from && token.to > from);
  const before = tokens.findLast((token) => token.to <= from)?.kind;
  const after = tokens.find((token) => token.from >= to && token.to > to)?.kind ?? "close";
  return (
    !inside &&
    before !== undefined &&
    ["prefix", "open", "separator", "operator"].includes(before) &&
    ["close", "separator", "operator", "postfix"].includes(after)
  );
}
