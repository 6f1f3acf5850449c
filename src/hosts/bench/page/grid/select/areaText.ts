import { addressText, columnLetters } from "../../../../../sheet/book/address.js";
import type { Area } from "../../../../../sheet/book/book.js";
import { isOneCell, isWholeColumns, isWholeRows } from "./areas.js";

/** An area as a formula writes it: `B2`, `B2:D9`, `B:D`, `2:9`. */
export function areaText(area: Area): string {
  if (isWholeColumns(area)) return `${columnLetters(area.left)}:${columnLetters(area.right)}`;
  if (isWholeRows(area)) return `${area.top + 1}:${area.bottom + 1}`;
  const first = addressText(area.top, area.left);
  return isOneCell(area) ? first : `${first}:${addressText(area.bottom, area.right)}`;
}
