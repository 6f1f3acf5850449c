import type { Book } from "../../sheet/book/book.js";
import type { Edit } from "../../sheet/edit/draft.js";

/** Has every formula of a book calculated, as after reading it from where only what was typed is kept. */
export function calculateAll(book: Book): Edit {
  return (draft) => {
    for (const [sheet, { columns }] of book.sheets.entries()) {
      for (const [column, { runs }] of columns.entries()) {
        for (const { from, to } of runs) draft.stale.push({ sheet, column, from, to });
      }
    }
  };
}
