import type { Area, Book, Place } from "../book/book.js";
import { columnAt } from "../book/book.js";
import { readCell } from "../book/cells.js";
import { spanAt } from "../book/spans.js";
import { formulaText } from "../formula/formula.js";
import { toText } from "../values/toText.js";

export interface Search {
  readonly text: string;
  readonly matchCase?: boolean | undefined;
  /** The whole of the cell, not a part. */
  readonly wholeCell?: boolean | undefined;
  /** Formulas as typed instead of what they gave. */
  readonly inFormulas?: boolean;
}

/** The cells of an area that hold a text, row by row within each column. */
export function* findCells(book: Book, area: Area, search: Search): Generator<Place, void> {
  const matches = matcher(search);
  for (let column = area.left; column <= area.right; column++) {
    const { cells, runs } = columnAt(book, area.sheet, column);
    for (let row = area.top; row <= Math.min(area.bottom, cells.length - 1); row++) {
      const run = search.inFormulas ? spanAt(runs, row) : undefined;
      const shown = run === undefined ? toText(readCell(cells, row)) : formulaText(run.formula, row, column);
      const text = typeof shown === "string" ? shown : shown.code;
      if (matches(text)) {
        yield { sheet: area.sheet, row, column };
      }
    }
  }
}

export function matcher({ text, matchCase, wholeCell }: Search): (shown: string) => boolean {
  const pattern = patternOf({ text, matchCase, wholeCell }, "");
  return (shown) => pattern.test(shown);
}

/** A search as a regular expression: its text is taken letter by letter. */
export function patternOf({ text, matchCase, wholeCell }: Search, flags: "" | "g"): RegExp {
  const literal = text.replace(/[.*+?^${}()|[\]\\]/g, "\\$&");
  return new RegExp(wholeCell ? `^${literal}$` : literal, matchCase ? flags : `${flags}i`);
}
