import type { Column } from "../../call/column.js";
import type { Place } from "../book/book.js";
import type { Edit } from "./draft.js";
import { writeContent } from "./draft.js";

/** Puts values below each other, the first at a place. The numbers are shared, not copied: they must not change. */
export function setColumn(place: Place, values: Column): Edit {
  const { sheet, column, row } = place;
  return (draft) => writeContent(draft, { sheet, column, from: row }, values, []);
}
