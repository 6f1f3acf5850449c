import type { Area } from "../book/book.js";
import { columnAt } from "../book/book.js";
import { readCell } from "../book/cells.js";
import { spanAt } from "../book/spans.js";
import { formulaText } from "../formula/formula.js";
import type { Search } from "../view/findCells.js";
import { findCells, patternOf } from "../view/findCells.js";
import type { Edit } from "./draft.js";
import type { Entry } from "./setCells.js";
import { setCells } from "./setCells.js";

/**
 * Replaces a text wherever it stands in texts that were typed and, with `inFormulas`, in formulas. Numbers and what
 * formulas gave stay as they are. A text stays a text.
 */
export function replaceText(area: Area, search: Search, replacement: string): Edit {
  return (draft) => {
    const book = draft.session.snapshot();
    const pattern = patternOf(search, "g");
    const replace = (text: string): string => text.replace(pattern, () => replacement);
    for (const place of findCells(book, area, search)) {
      const { cells, runs, claims } = columnAt(book, place.sheet, place.column);
      const run = spanAt(runs, place.row);
      const typed = readCell(cells, place.row);
      let entry: Entry | undefined;
      if (run !== undefined) {
        entry = search.inFormulas ? { formula: replace(formulaText(run.formula, place.row, place.column)) } : undefined;
      } else if (typeof typed === "string" && spanAt(claims, place.row) === undefined) {
        entry = replace(typed);
      }
      if (entry !== undefined) {
        setCells(place, [[entry]])(draft);
      }
    }
  };
}
