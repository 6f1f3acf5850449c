import type { Column } from "../../call/column.js";
import type { Book, ColumnSpan, Run } from "../book/book.js";
import { replaceInPlace, spansIn } from "../book/spans.js";
import { releaseSpills } from "../calculate/placeSpill.js";
import type { Session } from "../calculate/session.js";
import { openSession } from "../calculate/session.js";
import type { Dirty } from "../depend/propagate.js";
import { sameFormula } from "../formula/formula.js";
import type { Functions } from "../formula/functions.js";

/** A book in the making: what an edit writes into and what it leaves to be calculated. */
export interface Draft {
  readonly functions: Functions;
  session: Session;
  changed: ColumnSpan[];
  stale: ColumnSpan[];
}

/** One step of work on a book. */
export interface Edit {
  (draft: Draft): void;
  /** Whether it looks at what formulas give, so that edits before it are to be calculated first. */
  readonly readsValues?: boolean;
}

export function openDraft(book: Book, functions: Functions): Draft {
  return { functions, session: openSession(book), changed: [], stale: [] };
}

export function closeDraft(draft: Draft): { readonly book: Book; readonly dirty: Dirty } {
  const { session, changed, stale } = draft;
  return { book: session.snapshot(), dirty: { changed: [...changed, ...touchedIn(session)], stale } };
}

/** Cells that an edit filled or cleared besides those it says. */
export function touchedIn(session: Session): ColumnSpan[] {
  return session.touched.map(({ sheet, column, from, to }) => ({ sheet, column, from, to }));
}

export const sameRun = (a: Run, b: Run): boolean => sameFormula(a.formula, b.formula);

/** Puts literals and formulas in place of whatever rows of a column held; literals in rows of a run do not count. */
export function writeContent(
  draft: Draft,
  at: { readonly sheet: number; readonly column: number; readonly from: number },
  literals: Column,
  runs: readonly Run[],
): void {
  const { sheet, column, from } = at;
  const to = from + literals.length;
  if (from >= to) {
    return;
  }
  releaseSpills(draft.session, at, from, to);
  const target = draft.session.column(sheet, column);
  for (const claim of spansIn(target.claims, from, to)) {
    const owners =
      claim.row === undefined
        ? { from: Math.max(from, claim.from), to: Math.min(to, claim.to) }
        : { from: claim.row, to: claim.row + 1 };
    releaseSpills(draft.session, { sheet, column: claim.column }, owners.from, owners.to);
    draft.stale.push({ sheet, column: claim.column, ...owners });
  }
  if (runs.length > 0 || spansIn(target.runs, from, to).length > 0) {
    replaceInPlace(target.ownRuns(), from, to, runs, sameRun);
  }
  target.cells.writeColumn(from, literals);
  draft.changed.push({ sheet, column, from, to });
  if (runs.length > 0) {
    draft.stale.push({ sheet, column, from, to });
  }
}
