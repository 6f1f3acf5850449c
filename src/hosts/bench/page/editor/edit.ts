import type { Place } from "../../../../sheet/book/book.js";
import type { Action } from "../../protocol/request.js";
import type { Page } from "../page.js";

/** One text being typed. */
export interface Edit {
  readonly place: Place;
  /** What the cell holds as the view shows it; undefined while it is not known, or where a draft was taken up. */
  original: string | undefined;
  /** The entry of the cell is on its way and belongs in front of what was typed meanwhile. */
  awaitsEntry: boolean;
  /** Arrows pick cells, or leave the cell, rather than move the caret. */
  arrowsPick: boolean;
}

/** What enters a text: in its place, or over all cells selected around it. */
export function entering(text: string, place: Place, over: boolean, page: Page): Action {
  const { area } = page.selection();
  const isInside =
    area.sheet === place.sheet &&
    area.top <= place.row &&
    place.row <= area.bottom &&
    area.left <= place.column &&
    place.column <= area.right;
  const isMany = area.top !== area.bottom || area.left !== area.right;
  return over && isInside && isMany ? { do: "type over", area, place, text } : { do: "type", place, texts: [[text]] };
}

export function isSamePlace(one: Place, other: Place): boolean {
  return one.sheet === other.sheet && one.row === other.row && one.column === other.column;
}
