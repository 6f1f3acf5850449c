import type { Place } from "../../sheet/book/book.js";
import type { Entry } from "../../sheet/edit/setCells.js";
import { formulaText } from "../../sheet/formula/formula.js";
import type { Functions } from "../../sheet/formula/functions.js";
import { readFormula } from "../../sheet/formula/readFormula.js";

/** What a clipboard holds, row by row, all rows of one length. */
export interface ClipboardTable {
  readonly rows: readonly (readonly Entry[])[];
  /** Where the first cell stood, where the table was copied from here: formulas are those of that place. */
  readonly origin: Pick<Place, "row" | "column"> | undefined;
}

/** The entries to put at a place: relative references of formulas move along, as with any copy. */
export function entriesAt(
  table: ClipboardTable,
  place: Pick<Place, "row" | "column">,
  functions: Functions,
): Entry[][] {
  const { rows, origin = place } = table;
  return rows.map((row, down) =>
    row.map((entry, across) => {
      if (typeof entry !== "object" || entry === null || !("formula" in entry)) {
        return entry;
      }
      const formula = readFormula(entry.formula, origin.row + down, origin.column + across, functions);
      return { formula: formulaText(formula, place.row + down, place.column + across) };
    }),
  );
}
