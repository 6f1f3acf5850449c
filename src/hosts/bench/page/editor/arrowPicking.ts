import type { Area, Place } from "../../../../sheet/book/book.js";
import type { Grid } from "../grid/grid.js";
import type { Page } from "../page.js";

/** Cells picked by arrows: one corner stands, the other one moves. */
export interface ArrowPicking {
  /** From where the mouse left off. */
  startAt(area: Area): void;
  /** Forgets the cells picked; the next arrow starts from the cell typed in. */
  reset(): void;
  move(down: number, right: number, extend: boolean, toEdge: boolean): Promise<Area>;
}

export function createArrowPicking(page: Page, grid: Grid, editedPlace: () => Place): ArrowPicking {
  let area: Area | undefined;
  /** The corner that stays while the other one is moved. */
  let corner: Place | undefined;

  const start = (): Place => {
    const edited = editedPlace();
    return edited.sheet === page.sheet() ? edited : page.selection().active;
  };

  async function toEdgeFrom(place: Place, down: number, right: number, extend: boolean): Promise<Area> {
    const toward = down > 0 ? "down" : down < 0 ? "up" : right > 0 ? "right" : "left";
    const edge = await page.bench.edge(place, toward);
    grid.reveal(edge);
    return between(extend && corner ? corner : edge, edge);
  }

  return {
    startAt(picked) {
      area = picked;
      corner = { sheet: picked.sheet, row: picked.top, column: picked.left };
    },
    reset() {
      area = undefined;
      corner = undefined;
    },
    async move(down, right, extend, toEdge) {
      const from = area?.sheet === page.sheet() ? area : between(start(), start());
      const stays = corner?.sheet === from.sheet ? corner : { sheet: from.sheet, row: from.top, column: from.left };
      corner = stays;
      area = toEdge
        ? await toEdgeFrom(opposite(from, stays), down, right, extend)
        : grid.step(from, down, right, extend);
      if (!extend) corner = { sheet: area.sheet, row: area.top, column: area.left };
      return area;
    },
  };
}

function opposite({ sheet, top, left, bottom, right }: Area, corner: Place): Place {
  return { sheet, row: corner.row === top ? bottom : top, column: corner.column === left ? right : left };
}

export function between(one: Place, other: Place): Area {
  return {
    sheet: one.sheet,
    top: Math.min(one.row, other.row),
    left: Math.min(one.column, other.column),
    bottom: Math.max(one.row, other.row),
    right: Math.max(one.column, other.column),
  };
}
