import { addressText } from "../../../../sheet/book/address.js";
import type { Book, Run } from "../../../../sheet/book/book.js";
import { readColumn } from "../../../../sheet/book/readColumn.js";
import { spanAt } from "../../../../sheet/book/spans.js";
import { change } from "../../../../sheet/change.js";
import type { Edit } from "../../../../sheet/edit/draft.js";
import { setColumn } from "../../../../sheet/edit/setColumn.js";
import { formulaText } from "../../../../sheet/formula/formula.js";
import { functions } from "../functions.js";

export interface KeptValues {
  readonly book: Book;
  /** Undefined where every formula can be calculated here. */
  readonly finding: string | undefined;
}

/**
 * The values of formulas that cannot be calculated here, of functions or files that are not known, in the place of these
 * formulas: a book is calculated anew whenever it is opened, and they would be lost.
 */
export function keepValues(book: Book): KeptValues {
  const edits: Edit[] = [];
  let count = 0;
  let first: string | undefined;
  const put = (sheet: number, column: number, { from, to }: { from: number; to: number }): void => {
    edits.push(setColumn({ sheet, column, row: from }, readColumn(book, { sheet, column, from, to })));
  };
  for (const [sheet, { name, columns }] of book.sheets.entries()) {
    const isForeign = (run: Run | undefined): boolean => run?.formula.problem !== undefined;
    for (const [column, { runs }] of columns.entries()) {
      for (const run of runs.filter(isForeign)) {
        count += run.to - run.from;
        first ??= `${addressText(run.from, column, name)}: ${shortened(formulaText(run.formula, run.from, column))}`;
        put(sheet, column, run);
      }
    }
    for (const [column, { claims }] of columns.entries()) {
      for (const claim of claims) {
        const owner = columns[claim.column]?.runs ?? [];
        if (isForeign(spanAt(owner, claim.row ?? claim.from))) put(sheet, column, claim);
      }
    }
  }
  if (count === 0) return { book, finding: undefined };
  const formulas = `${count.toLocaleString("en")} ${count === 1 ? "formula" : "formulas"}`;
  return {
    book: change(book, edits, functions),
    finding: `${formulas} cannot be calculated here; what the file says ${count === 1 ? "it" : "they"} gave is kept as values (first ${first}).`,
  };
}

function shortened(text: string): string {
  return text.length > 60 ? `${text.slice(0, 59)}…` : text;
}
