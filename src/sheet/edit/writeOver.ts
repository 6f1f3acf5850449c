import { CellError } from "../../call/cell.js";
import type { Area, Place } from "../book/book.js";
import { blankColumn } from "../book/cells.js";
import { cellByCell } from "../evaluate/operateColumns.js";
import { readFormula } from "../formula/readFormula.js";
import type { Edit } from "./draft.js";
import { writeContent } from "./draft.js";
import { placeFormula } from "./placeFormula.js";
import type { Entry } from "./setCells.js";

/** One entry in all cells of an area; a formula as typed in the cell at `place`, its relative references moving. */
export function writeOver(area: Area, entry: Entry, place: Place): Edit {
  const { sheet, top, bottom, left, right } = area;
  const rows = bottom + 1 - top;
  return (draft) => {
    const isFormula = typeof entry === "object" && entry !== null && !(entry instanceof CellError);
    const formula = isFormula ? readFormula(entry.formula, place.row, place.column, draft.functions) : undefined;
    for (let column = left; column <= right; column++) {
      const literals = isFormula ? blankColumn(rows) : cellByCell(rows, () => entry);
      const runs = formula === undefined ? [] : placeFormula(formula, column, top, bottom + 1);
      writeContent(draft, { sheet, column, from: top }, literals, runs);
    }
  };
}
