import type { Area, Book } from "../../../../sheet/book/book.js";
import { usedColumns, usedRows } from "../../../../sheet/book/usedRows.js";

/** The part of an area that lies in the used cells of its sheet; at least its first cell. */
export function clipArea(book: Book, area: Area): Area {
  const bottom = Math.max(area.top, Math.min(area.bottom, usedRows(book, area.sheet) - 1));
  const right = Math.max(area.left, Math.min(area.right, usedColumns(book, area.sheet) - 1));
  return { ...area, bottom, right };
}
