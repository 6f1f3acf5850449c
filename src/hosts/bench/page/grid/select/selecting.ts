import type { Area, Place } from "../../../../../sheet/book/book.js";
import type { Page } from "../../page.js";
import type { Sight, Spot } from "../layout/sight.js";
import {
  areaBetween,
  areaOf,
  columnsBetween,
  everything,
  isSameArea,
  isWholeColumns,
  isWholeRows,
  rowsBetween,
} from "./areas.js";

/** Selects by spots; remembers which corner of the area moves when it is extended. */
export interface Selecting {
  active(): Spot;
  /** The corner that moves. */
  lead(): Spot;
  placeOf(spot: Spot): Place;
  spotOf(place: Place): Spot;
  cell(spot: Spot): void;
  /** Moves the lead; whole columns and rows stay whole. */
  extend(spot: Spot): void;
  /** Makes a cell of the area the active one. */
  activate(spot: Spot): void;
  columns(from: number, to: number): void;
  rows(from: number, to: number): void;
  /** The columns or rows that the selection touches, whole; the active cell stays. */
  widen(to: "columns" | "rows"): void;
  all(): void;
  area(area: Area, active: Place, lead: Place): void;
}

export function createSelecting(page: Page, sight: Sight): Selecting {
  let remembered: { readonly area: Area; readonly lead: Place } | undefined;

  function choose(area: Area, active: Place, lead: Place): void {
    remembered = { area, lead };
    page.select(area, active, { reveal: false });
  }

  const spotOf = ({ row, column }: Place): Spot => ({ row: sight.rows.toView(row), column });
  const placeOf = ({ row, column }: Spot): Place => ({ sheet: page.sheet(), row: sight.rows.toSheet(row), column });

  function leadPlace(): Place {
    const { area, active } = page.selection();
    if (remembered && isSameArea(remembered.area, area)) return remembered.lead;
    return {
      sheet: area.sheet,
      row: active.row === area.top ? area.bottom : area.top,
      column: active.column === area.left ? area.right : area.left,
    };
  }

  function extend(spot: Spot): void {
    const { area, active } = page.selection();
    const lead = placeOf(spot);
    const [areColumns, areRows] = [isWholeColumns(area), isWholeRows(area)];
    if (areColumns && areRows) return;
    if (areColumns || areRows) {
      const whole = areColumns
        ? columnsBetween(area.sheet, active.column, lead.column)
        : rowsBetween(area.sheet, active.row, lead.row);
      choose(whole, active, lead);
      return;
    }
    // The active cell may have walked inside the area; the corner opposite to the lead is what stays.
    const anchor = remembered && isSameArea(remembered.area, area) ? opposite(area, remembered.lead) : active;
    choose(
      areaBetween(anchor, lead),
      active.row === anchor.row && active.column === anchor.column ? active : anchor,
      lead,
    );
  }

  return {
    active: () => spotOf(page.selection().active),
    lead: () => spotOf(leadPlace()),
    placeOf,
    spotOf,
    cell(spot) {
      const place = placeOf(spot);
      choose(areaOf(place), place, place);
    },
    extend,
    activate(spot) {
      const { area } = page.selection();
      const place = placeOf(spot);
      page.select(area, place, { reveal: false });
    },
    columns(from, to) {
      const sheet = page.sheet();
      choose(columnsBetween(sheet, from, to), { sheet, row: 0, column: from }, { sheet, row: 0, column: to });
    },
    rows(from, to) {
      const sheet = page.sheet();
      const [one, other] = [sight.rows.toSheet(from), sight.rows.toSheet(to)];
      choose(rowsBetween(sheet, one, other), { sheet, row: one, column: 0 }, { sheet, row: other, column: 0 });
    },
    widen(to) {
      const { area, active } = page.selection();
      const whole =
        to === "columns"
          ? columnsBetween(area.sheet, area.left, area.right)
          : rowsBetween(area.sheet, area.top, area.bottom);
      choose(whole, active, leadPlace());
    },
    all() {
      const sheet = page.sheet();
      const { active } = page.selection();
      choose(everything(sheet), active, active);
    },
    area: choose,
  };
}

function opposite(area: Area, corner: Place): Place {
  return {
    sheet: area.sheet,
    row: corner.row === area.top ? area.bottom : area.top,
    column: corner.column === area.left ? area.right : area.left,
  };
}
