import { columnAt } from "../sheet/book/book.js";
import { spansIn } from "../sheet/book/spans.js";
import type { Formula } from "../sheet/formula/formula.js";
import type { Reference } from "../sheet/formula/reference.js";
import type { BookTable } from "./bookTable.js";
import type { LedgerColumn } from "./ledger.js";

/**
 * Whether every formula of the derived columns reads its own row of the table, and else only typed cells above the data: then
 * what a change does to one row can be found without the others.
 */
export function isRowWise(table: BookTable, columns: readonly LedgerColumn[]): boolean {
  const { book, sheet, firstRow, rows } = table;
  const isTyped = book.sheets[sheet]!.columns.every(({ runs }) => spansIn(runs, 0, firstRow).length === 0);
  if (!isTyped) return false;
  return columns.every(({ role, pair }) => {
    if (role !== "derived") return true;
    const state = columnAt(book, sheet, pair.from.column);
    const runs = spansIn(state.runs, firstRow, firstRow + rows);
    return state.claims.length === 0 && runs.every(({ formula }) => readsItsRow(formula, firstRow));
  });
}

function readsItsRow({ references, texts, names }: Formula, firstRow: number): boolean {
  if (names.length > 0) return false;
  // `A2#` is all that a formula filled, whatever the row.
  if (texts.some((text, index) => index > 0 && text.startsWith("#"))) return false;
  return references.every((reference) => reference === undefined || isOwnRow(reference, firstRow));
}

function isOwnRow({ sheet, top, bottom, whole }: Reference, firstRow: number): boolean {
  if (sheet !== undefined || whole !== undefined) return false;
  const isOwn = !top.fixed && !bottom.fixed && top.at === 0 && bottom.at === 0;
  return isOwn || (top.fixed && bottom.fixed && Math.max(top.at, bottom.at) < firstRow);
}
