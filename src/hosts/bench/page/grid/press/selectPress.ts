import type { Sight } from "../layout/sight.js";
import type { Selecting } from "../select/selecting.js";
import type { At, Gesture } from "./gesture.js";

/** A press on cells, letters, row numbers or the corner selects; going on selects what lies between. */
export function selectPress(at: At, extend: boolean, selecting: Selecting, sight: Sight): Gesture {
  const anchor = extend ? selecting.active() : at;
  const begin = extend ? selecting.extend : selecting.cell;
  const select = (to: At) => {
    if (at.on === "letters") selecting.columns(anchor.column, to.column);
    else if (at.on === "numbers") selecting.rows(anchor.row, to.row);
    else if (at.on === "cells") selecting.extend(to);
  };
  if (at.on === "corner") selecting.all();
  else if (at.on === "cells") begin(at);
  else select(at);
  let [row, column] = [at.row, at.column];
  return {
    scrolls: at.on === "letters" ? "across" : at.on === "numbers" ? "down" : "both",
    move(to) {
      if (at.on === "corner" || (to.row === row && to.column === column)) return;
      [row, column] = [Math.min(to.row, sight.rows.count - 1), to.column];
      select({ ...to, row, column });
    },
    end: () => {},
  };
}
