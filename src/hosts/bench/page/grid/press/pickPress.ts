import type { Area } from "../../../../../sheet/book/book.js";
import type { Page } from "../../page.js";
import { areaBetween, columnsBetween, everything, rowsBetween } from "../select/areas.js";
import type { Picking } from "../select/picking.js";
import type { Selecting } from "../select/selecting.js";
import type { At, Gesture } from "./gesture.js";

/** While a formula is typed a press picks cells for it. */
export function pickPress(at: At, extend: boolean, page: Page, picking: Picking, selecting: Selecting): Gesture {
  const anchor = extend ? picking.anchor() : at;
  function areaTo(to: At): Area {
    const sheet = page.sheet();
    const [one, other] = [selecting.placeOf(anchor), selecting.placeOf(to)];
    if (at.on === "corner") return everything(sheet);
    if (at.on === "letters") return columnsBetween(sheet, one.column, other.column);
    return at.on === "numbers" ? rowsBetween(sheet, one.row, other.row) : areaBetween(one, other);
  }
  picking.press(areaTo(at), anchor, at);
  let [row, column] = [at.row, at.column];
  return {
    scrolls: "both",
    move(to) {
      if (to.row === row && to.column === column) return;
      [row, column] = [to.row, to.column];
      picking.drag(areaTo(to), to);
    },
    end: () => picking.release(),
    cancel: () => picking.release(),
  };
}
