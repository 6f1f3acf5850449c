import type { Frame } from "../layout/frame.js";
import type { Selecting } from "../select/selecting.js";
import type { Painter } from "./painter.js";
import type { Tip } from "./tip.js";

/** The focus stays with the table; the active cell is named to those who hear the page. */
export function createActiveCell(
  frame: Frame,
  selecting: Selecting,
  painter: Painter,
  tip: Tip,
): { readonly paint: () => void } {
  let named: HTMLElement | undefined;
  let key = "";
  let turn = 0;

  function paint(): void {
    const spot = selecting.active();
    const next = painter.elementOf(spot);
    const message = tip.messageOf(spot);
    const nextKey = `${spot.row}:${spot.column}:${message}`;
    if (named === next && key === nextKey) return;
    named?.removeAttribute("id");
    named?.removeAttribute("aria-describedby");
    // Another name at every move, as the element may be the same one with another cell.
    turn = 1 - turn;
    named = next;
    key = nextKey;
    if (!next) {
      frame.table.removeAttribute("aria-activedescendant");
      return;
    }
    next.id = `${frame.tip.id}-active-${turn}`;
    if (message !== undefined) next.setAttribute("aria-describedby", frame.tip.id);
    frame.table.setAttribute("aria-activedescendant", next.id);
  }

  return { paint };
}
