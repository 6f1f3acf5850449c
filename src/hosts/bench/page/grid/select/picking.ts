import type { Area } from "../../../../../sheet/book/book.js";
import type { Page } from "../../page.js";
import type { GridEvents } from "../grid.js";
import type { Sight, Spot } from "../layout/sight.js";
import type { Marks } from "../paint/marks.js";
import { areaBetween, areaOf, isSameArea } from "./areas.js";
import type { Selecting } from "./selecting.js";

/** Cells picked for the formula that is being typed; the selection stays where the formula goes. */
export interface Picking {
  /** The corner that moves. */
  lead(): Spot;
  press(area: Area, anchor: Spot, lead: Spot): void;
  /** The press went on to here. */
  drag(area: Area, lead: Spot): void;
  release(): void;
  /** By keyboard. */
  move(spot: Spot, extend: boolean): void;
  /** What a key makes of a picked area, without telling it. */
  stepFrom(from: Area, spotAfter: (lead: Spot) => Spot, extend: boolean): Area;
  anchor(): Spot;
  clear(): void;
}

export function createPicking(
  page: Page,
  events: GridEvents,
  sight: Sight,
  selecting: Selecting,
  marks: Marks,
  reveal: (spot: Spot) => void,
  request: () => void,
): Picking {
  let ends: { readonly anchor: Spot; readonly lead: Spot } | undefined;

  function show(area: Area, anchor: Spot, lead: Spot): void {
    ends = { anchor, lead };
    marks.picked = area;
    request();
  }

  function stepFrom(from: Area, spotAfter: (lead: Spot) => Spot, extend: boolean): Area {
    const isKnown = marks.picked !== undefined && ends !== undefined && isSameArea(marks.picked, from);
    const topLeft = { row: sight.rows.toView(from.top), column: from.left };
    const anchor = isKnown ? ends!.anchor : topLeft;
    const lead = spotAfter(isKnown ? ends!.lead : topLeft);
    const place = selecting.placeOf(lead);
    const area = extend ? areaBetween(selecting.placeOf(anchor), place) : areaOf(place);
    show(area, extend ? anchor : lead, lead);
    reveal(lead);
    return area;
  }

  return {
    lead: () => ends?.lead ?? selecting.active(),
    anchor: () => ends?.anchor ?? selecting.active(),
    press(area, anchor, lead) {
      show(area, anchor, lead);
      events.pick(area, false);
    },
    drag(area, lead) {
      show(area, ends?.anchor ?? lead, lead);
      events.pick(area, false);
    },
    release() {
      if (marks.picked) events.pick(marks.picked, true);
    },
    move(spot, extend) {
      const from = marks.picked ?? areaOf(page.selection().active);
      events.pick(
        stepFrom(from, () => spot, extend),
        true,
      );
    },
    stepFrom,
    clear() {
      ends = undefined;
      marks.picked = undefined;
    },
  };
}
