import type { Book, ColumnSpan, Run, Sheet } from "../../book/book.js";
import { emptyColumn } from "../../book/book.js";
import { mergeSpans } from "../../book/spans.js";
import { openSession } from "../../calculate/session.js";
import type { Draft } from "../draft.js";
import { sameRun, touchedIn } from "../draft.js";
import type { Rewriting } from "./rewriteRun.js";
import { rewriteFormula, rewriteRun } from "./rewriteRun.js";

/** An edit that moves cells: where formulas and references go, and what becomes of everything else. */
export interface Restructuring {
  readonly rule: Rewriting;
  /** The sheets with their values, spills and claims in their new places; the runs are put in afterwards. */
  moveCells(sheets: readonly Sheet[]): readonly Sheet[];
  /** Where cells that wait to be calculated go. */
  moveSpan(span: ColumnSpan): readonly ColumnSpan[];
}

/** Moves cells and rewrites every reference to them. */
export function restructure(draft: Draft, { rule, moveCells, moveSpan }: Restructuring): void {
  const book = draft.session.snapshot();
  const waiting = [...draft.changed, ...touchedIn(draft.session)];
  draft.changed = waiting.flatMap(moveSpan);
  draft.stale = draft.stale.flatMap(moveSpan);

  const nowhere = { sheet: -1, row: 0, column: 0 };
  const staleNames = new Set<string>();
  const names = book.names.map((name) => {
    const { formula, stale } = rewriteFormula(name.formula, nowhere, nowhere, rule);
    if (stale) {
      staleNames.add(name.name.toUpperCase());
    }
    return formula === name.formula ? name : { ...name, formula };
  });

  const usesStaleName = (run: Run): boolean => run.formula.names.some((name) => staleNames.has(name.toUpperCase()));
  const runs = moveRuns(draft, book, rule, usesStaleName);
  const sheets = moveCells(book.sheets).map((sheet, index) =>
    withRuns(sheet, runs[index] as ReadonlyMap<number, readonly Run[]>),
  );
  draft.session = openSession({ sheets, names });
}

/** The runs of each sheet and column in their new places. */
function moveRuns(
  draft: Draft,
  book: Book,
  rule: Rewriting,
  usesStaleName: (run: Run) => boolean,
): ReadonlyMap<number, readonly Run[]>[] {
  const moved = book.sheets.map(() => new Map<number, Run[]>());
  const kept = book.sheets.map(() => new Map<number, readonly Run[]>());
  for (const [sheet, { columns }] of book.sheets.entries()) {
    for (const [column, { runs }] of columns.entries()) {
      const parts = runs.flatMap((run) => rewriteRun(run, sheet, column, rule).map((part) => ({ run, part })));
      const same =
        parts.length === runs.length &&
        parts.every(
          ({ run, part }) =>
            part.from === run.from &&
            part.column === column &&
            part.sheet === sheet &&
            part.formula === run.formula &&
            part.to === run.to,
        );
      for (const { run, part } of parts) {
        if (part.stale || usesStaleName(run)) {
          draft.stale.push({ sheet: part.sheet, column: part.column, from: part.from, to: part.to });
        }
        if (!same) {
          const list = moved[part.sheet]?.get(part.column) ?? [];
          list.push({ from: part.from, to: part.to, formula: part.formula });
          moved[part.sheet]?.set(part.column, list);
        }
      }
      if (same && runs.length > 0) {
        kept[sheet]?.set(column, runs);
      }
    }
  }
  return moved.map((byColumn, sheet) => {
    const all = new Map(kept[sheet]);
    for (const [column, list] of byColumn) {
      const together = [...(all.get(column) ?? []), ...list].sort((a, b) => a.from - b.from);
      all.set(column, mergeSpans(together, sameRun));
    }
    return all;
  });
}

function withRuns(sheet: Sheet, runs: ReadonlyMap<number, readonly Run[]>): Sheet {
  const last = Math.max(sheet.columns.length, ...[...runs.keys()].map((column) => column + 1));
  const columns = Array.from({ length: last }, (_, column) => {
    const own = sheet.columns[column] ?? emptyColumn;
    const ownRuns = runs.get(column);
    if (ownRuns === undefined) {
      return own.runs.length === 0 ? own : { ...own, runs: [] };
    }
    return ownRuns === own.runs ? own : { ...own, runs: ownRuns };
  });
  return { ...sheet, columns };
}
