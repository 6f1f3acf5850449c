import type { Area, Book, Place } from "../book/book.js";
import { mostColumns, mostRows } from "../limits.js";
import type { Content } from "./content.js";
import { contentOf } from "./content.js";
import type { Draft, Edit } from "./draft.js";
import { writeContent } from "./draft.js";
import { placeFormula } from "./placeFormula.js";
import { EditRefused } from "./refused.js";

/** What was copied: an area of a book as it was then. */
export interface Clip {
  readonly book: Book;
  readonly area: Area;
}

/** Puts what was copied to a place: relative references move along, or with `values` only what the cells showed. */
export function pasteCells(clip: Clip, place: Place, what: "formulas" | "values" = "formulas"): Edit {
  const { book, area } = clip;
  return (draft) => {
    refuseOffSheet("paste", place, area);
    for (let column = area.left; column <= area.right; column++) {
      const content = what === "values" ? valuesOf(clip, column) : contentOf(book, area, column);
      writeMoved(draft, content, area.top, { ...place, column: place.column + column - area.left });
    }
  };
}

function valuesOf({ book, area }: Clip, column: number): Content {
  // An area of one column: nothing counts as filled from within it.
  return { values: contentOf(book, { ...area, left: -1, right: -1 }, column).values, runs: [] };
}

/** Writes content that stood at row `top` to another place; its formulas keep their relative references. */
export function writeMoved(draft: Draft, content: Content, top: number, place: Place): void {
  const { sheet, row, column } = place;
  const runs = content.runs.flatMap(({ from, to, formula }) =>
    placeFormula(formula, column, from - top + row, to - top + row),
  );
  writeContent(draft, { sheet, column, from: row }, content.values, runs);
}

export function refuseOffSheet(what: string, place: Place, area: Area): void {
  const rows = area.bottom - area.top + 1;
  const columns = area.right - area.left + 1;
  if (place.row < 0 || place.column < 0 || place.row + rows > mostRows || place.column + columns > mostColumns) {
    throw new EditRefused(
      `${what}: ${rows} x ${columns} cells reach over the edge of the sheet there; a place with more room is needed`,
    );
  }
}
