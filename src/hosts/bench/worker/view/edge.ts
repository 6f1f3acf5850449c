import type { Place } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { bookOfSession, type Session } from "../session.js";
import { sheetSize } from "../state/sheetSize.js";
import { isVisible } from "./visibleRows.js";

/**
 * From a filled cell with a filled neighbour the last one before a blank, else the next filled cell, else the end of
 * what is in use. Rows that a filter hides are passed over.
 */
export function edge(session: Session, place: Place, toward: "down" | "up" | "left" | "right"): Place {
  const book = bookOfSession(session);
  const { rows, columns } = sheetSize(book.sheets[place.sheet]!);
  const filter = session.filters[place.sheet];
  const step = toward === "down" || toward === "right" ? 1 : -1;
  const along = toward === "down" || toward === "up" ? "row" : "column";
  const end = step < 0 ? 0 : Math.max(place[along], (along === "row" ? rows : columns) - 1);
  const isSeen = (at: number) => along === "column" || isVisible(filter, at);
  const isFilled = (at: number) => cellOf(book, { ...place, [along]: at }) !== null;
  const next = (from: number): number | undefined => {
    for (let at = from + step; step > 0 ? at <= end : at >= end; at += step) if (isSeen(at)) return at;
    return undefined;
  };
  let at = place[along];
  const neighbour = next(at);
  if (neighbour === undefined) return place;
  const runs = isFilled(at) && isFilled(neighbour);
  for (let ahead: number | undefined = neighbour; ahead !== undefined; ahead = next(at)) {
    if (runs && !isFilled(ahead)) break;
    at = ahead;
    if (!runs && isFilled(at)) break;
  }
  return { ...place, [along]: at };
}
