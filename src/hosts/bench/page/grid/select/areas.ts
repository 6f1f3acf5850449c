import type { Area, Place } from "../../../../../sheet/book/book.js";
import { mostColumns, mostRows } from "../../../../../sheet/limits.js";

export function areaOf({ sheet, row, column }: Place): Area {
  return { sheet, top: row, left: column, bottom: row, right: column };
}

export function areaBetween(one: Place, other: Place): Area {
  return {
    sheet: one.sheet,
    top: Math.min(one.row, other.row),
    left: Math.min(one.column, other.column),
    bottom: Math.max(one.row, other.row),
    right: Math.max(one.column, other.column),
  };
}

/** Whole columns reach to the last row that a sheet can have, so that they stay whole when rows are added. */
export function columnsBetween(sheet: number, one: number, other: number): Area {
  return areaBetween({ sheet, row: 0, column: one }, { sheet, row: mostRows - 1, column: other });
}

export function rowsBetween(sheet: number, one: number, other: number): Area {
  return areaBetween({ sheet, row: one, column: 0 }, { sheet, row: other, column: mostColumns - 1 });
}

export function everything(sheet: number): Area {
  return areaBetween({ sheet, row: 0, column: 0 }, { sheet, row: mostRows - 1, column: mostColumns - 1 });
}

export const isWholeColumns = (area: Area) => area.top === 0 && area.bottom === mostRows - 1;
export const isWholeRows = (area: Area) => area.left === 0 && area.right === mostColumns - 1;
export const isOneCell = (area: Area) => area.top === area.bottom && area.left === area.right;

export function holds(area: Area, row: number, column: number): boolean {
  return row >= area.top && row <= area.bottom && column >= area.left && column <= area.right;
}

export function isSameArea(one: Area, other: Area): boolean {
  return (
    one.sheet === other.sheet &&
    one.top === other.top &&
    one.left === other.left &&
    one.bottom === other.bottom &&
    one.right === other.right
  );
}
