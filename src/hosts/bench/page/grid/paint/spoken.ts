import { addressText } from "../../../../../sheet/book/address.js";
import type { Page } from "../../page.js";
import type { Frame } from "../layout/frame.js";
import type { Sight } from "../layout/sight.js";
import { isOneCell } from "../select/areas.js";
import { areaText } from "../select/areaText.js";
import type { Tip } from "./tip.js";

/** So long a move must rest before it is told: nobody hears every cell of a held arrow key. */
const rest = 120;

/** Tells the active cell to those who hear the page: where it is, what it shows, what is wrong with it. */
export function createSpoken(page: Page, frame: Frame, sight: Sight, tip: Tip): { moved(): void; stop(): void } {
  let timer: ReturnType<typeof setTimeout> | undefined;

  function sentence(): string {
    const { area, active } = page.selection();
    const spot = { row: sight.rows.toView(active.row), column: active.column };
    const state = page.sheetState().columnStates[active.column];
    const text = page.cells.cellAt(spot.row, spot.column)?.text || "blank";
    const message = tip.messageOf(spot);
    const unit = active.row > 0 && state?.unit ? ` ${state.unit}` : "";
    const parts = [`${addressText(active.row, active.column)}, ${text}${unit}`];
    if (active.row > 0 && state?.name) parts.push(state.name);
    if (message) parts.push(message);
    if (!isOneCell(area)) parts.push(`${areaText(area)} selected`);
    return parts.join("; ");
  }

  return {
    moved() {
      clearTimeout(timer);
      timer = setTimeout(() => {
        frame.live.textContent = sentence();
      }, rest);
    },
    stop: () => clearTimeout(timer),
  };
}
