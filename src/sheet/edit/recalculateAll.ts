import type { Edit } from "./draft.js";

/** Has every formula calculated anew. */
export const recalculateAll: Edit = (draft) => {
  for (const [sheet, { columns }] of draft.session.snapshot().sheets.entries()) {
    for (const [column, { runs }] of columns.entries()) {
      draft.stale.push(...runs.map(({ from, to }) => ({ sheet, column, from, to })));
    }
  }
};
