import type { Formula } from "../formula/formula.js";
import type { Edit } from "./draft.js";

/** Has formulas calculated anew, or those of them that are meant. */
export function recalculate(isMeant: (formula: Formula) => boolean = () => true): Edit {
  return (draft) => {
    for (const [sheet, { columns }] of draft.session.snapshot().sheets.entries()) {
      for (const [column, { runs }] of columns.entries()) {
        for (const { formula, from, to } of runs) {
          if (isMeant(formula)) {
            draft.stale.push({ sheet, column, from, to });
          }
        }
      }
    }
  };
}
