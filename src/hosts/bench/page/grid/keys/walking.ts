import type { Area } from "../../../../../sheet/book/book.js";
import type { Page } from "../../page.js";
import type { Sight, Spot } from "../layout/sight.js";
import { isOneCell } from "../select/areas.js";
import type { Selecting } from "../select/selecting.js";
import { walk } from "../select/walk.js";
import { stepped } from "./motions.js";

/** Tab and Enter: through the selection where there is one, else on; Enter goes back below where the Tabs began. */
export interface Walking {
  advance(down: number, right: number): void;
  /** Another move ended the line of Tabs. */
  forget(): void;
}

export function createWalking(page: Page, sight: Sight, selecting: Selecting, reveal: (spot: Spot) => void): Walking {
  let lineStart: { readonly spot: Spot; readonly next: Spot } | undefined;

  function inside(area: Area, down: number, right: number): void {
    const backwards = down + right < 0;
    const next = walk(area, selecting.active(), { down: down !== 0, backwards }, sight.columns, sight.rows);
    selecting.activate(next);
    reveal(next);
  }

  return {
    advance(down, right) {
      const { area } = page.selection();
      if (!isOneCell(area)) return inside(area, down, right);
      const from = selecting.active();
      const isLine = lineStart?.next.row === from.row && lineStart.next.column === from.column;
      const start = isLine ? lineStart!.spot : from;
      const next = stepped(down === 0 ? from : { row: from.row, column: start.column }, down, right, sight);
      lineStart = right === 0 ? undefined : { spot: start, next };
      selecting.cell(next);
      reveal(next);
    },
    forget: () => {
      lineStart = undefined;
    },
  };
}
