import type { Cell } from "../../call/cell.js";
import { columnOf } from "../../call/column.js";
import type { Place, Run } from "../book/book.js";
import { mergeSpans } from "../book/spans.js";
import { readFormula } from "../formula/readFormula.js";
import type { Draft, Edit } from "./draft.js";
import { sameRun, writeContent } from "./draft.js";
import { placeFormula } from "./placeFormula.js";

/** What goes into a cell: a value, or a formula as typed in that cell. */
export type Entry = Cell | { readonly formula: string };

/** Puts a rectangle of entries, row by row, with its first cell at a place. */
export function setCells(place: Place, rows: readonly (readonly Entry[])[]): Edit {
  return (draft) => {
    const width = rows.reduce((most, row) => Math.max(most, row.length), 0);
    for (let across = 0; across < width; across++) {
      setDown(
        draft,
        { ...place, column: place.column + across },
        rows.map((row) => row[across] ?? null),
      );
    }
  };
}

function setDown(draft: Draft, place: Place, entries: readonly Entry[]): void {
  const { sheet, row, column } = place;
  const runs: Run[] = [];
  const literals = entries.map((entry, down): Cell => {
    if (!isFormula(entry)) {
      return entry;
    }
    const formula = readFormula(entry.formula, row + down, column, draft.functions);
    runs.push(...placeFormula(formula, column, row + down, row + down + 1));
    return null;
  });
  writeContent(draft, { sheet, column, from: row }, columnOf(literals), mergeSpans(runs, sameRun));
}

function isFormula(entry: Entry): entry is { readonly formula: string } {
  return typeof entry === "object" && entry !== null && "formula" in entry;
}
