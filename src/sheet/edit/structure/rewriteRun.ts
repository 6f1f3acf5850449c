import type { Run } from "../../book/book.js";
import type { Span } from "../../book/spans.js";
import type { Formula } from "../../formula/formula.js";
import { withReferences } from "../../formula/formula.js";
import type { Bound, Rectangle, Reference } from "../../formula/reference.js";
import { isOnSheet, resolve, resolveBound } from "../../formula/reference.js";

/** Where cells go in an edit that moves some of them. */
export interface Rewriting {
  /** The sheet whose cells move. */
  readonly sheet: number;
  sheetIndex(name: string | undefined, home: number): number;
  /** Rows of that sheet at which the rule changes: above and below one of them cells go different ways. */
  readonly rowCuts: readonly number[];
  /** Rows that are taken out: an edge of a range in them moves to a neighbour, each by another distance. */
  readonly gone?: Span;
  /** What a reference to cells of that sheet means afterwards; undefined where they are gone. */
  move(area: Rectangle, reference: Reference, home: Home): Moved | undefined;
  /** Where the cell of a formula goes; undefined where it is gone. */
  moveHome(home: Home): Home | undefined;
}

export interface Home {
  readonly sheet: number;
  readonly row: number;
  readonly column: number;
}

export interface Moved extends Rectangle {
  /** The sheet to name in the reference afterwards, where that changes. */
  readonly sheet?: string;
}

/** Some rows of a run after the edit, in their new place. */
export interface RewrittenRun extends Run {
  readonly sheet: number;
  readonly column: number;
  /** Whether its value may be another. */
  readonly stale: boolean;
}

/** A run cut where its rows or its references go different ways, each part with its references rewritten. */
export function rewriteRun(run: Run, sheet: number, column: number, rule: Rewriting): RewrittenRun[] {
  const cuts = rowsToCut(run, sheet, rule);
  const parts: RewrittenRun[] = [];
  for (let index = 0; index + 1 < cuts.length; index++) {
    const from = cuts[index] as number;
    const home = { sheet, row: from, column };
    const moved = rule.moveHome(home);
    if (moved !== undefined) {
      const { formula, stale } = rewriteFormula(run.formula, home, moved, rule);
      const to = moved.row + (cuts[index + 1] as number) - from;
      parts.push({ sheet: moved.sheet, column: moved.column, from: moved.row, to, formula, stale });
    }
  }
  return parts;
}

function rowsToCut(run: Run, sheet: number, rule: Rewriting): number[] {
  const cuts = new Set<number>(sheet === rule.sheet ? rule.rowCuts : []);
  for (const reference of run.formula.references) {
    if (reference === undefined || rule.sheetIndex(reference.sheet, sheet) !== rule.sheet || run.to - run.from === 1) {
      continue;
    }
    const { top, bottom } = reference;
    for (const bound of [top, bottom]) {
      for (const cut of bound.fixed ? [] : rule.rowCuts) {
        cuts.add(cut - bound.at);
      }
      if (!bound.fixed && rule.gone !== undefined && (top.fixed || bottom.fixed || top.at !== bottom.at)) {
        cutEveryRow(cuts, run, rule.gone, bound.at, sheet === rule.sheet);
      }
    }
    if (top.fixed !== bottom.fixed) {
      const turn = top.fixed ? top.at - bottom.at : bottom.at - top.at;
      cuts.add(turn);
      cuts.add(turn + 1);
    }
  }
  const inside = [...cuts].filter((cut) => cut > run.from && cut < run.to).sort((a, b) => a - b);
  return [run.from, ...inside, run.to];
}

function cutEveryRow(cuts: Set<number>, run: Run, gone: Span, offset: number, ownSheet: boolean): void {
  const to = Math.min(run.to, gone.to - offset);
  for (let row = Math.max(run.from, gone.from - offset); row < to; row++) {
    if (ownSheet && row === gone.from) {
      row = Math.max(row, Math.min(gone.to, to) - 1);
    }
    cuts.add(row);
  }
}

/** A formula whose cell goes from `home` to `moved`. */
export function rewriteFormula(
  formula: Formula,
  home: Home,
  moved: Home,
  rule: Rewriting,
): { readonly formula: Formula; readonly stale: boolean } {
  let same = true;
  let stale = formula.positional && (home.row !== moved.row || home.column !== moved.column);
  const references = formula.references.map((reference) => {
    if (reference === undefined) {
      return undefined;
    }
    const area = resolve(reference, home.row, home.column);
    const concerned = rule.sheetIndex(reference.sheet, home.sheet) === rule.sheet;
    const target: Moved | undefined = concerned ? rule.move(area, reference, home) : area;
    if (target === undefined || !isOnSheet(target)) {
      same = false;
      stale = true;
      return undefined;
    }
    stale ||= (concerned && reference.whole !== undefined) || !sameSize(area, target);
    const after = referenceTo(reference, target, home, moved);
    same &&= sameReference(reference, after);
    return after;
  });
  return { formula: same ? formula : withReferences(formula, references), stale };
}

function sameSize(a: Rectangle, b: Rectangle): boolean {
  return a.bottom - a.top === b.bottom - b.top && a.right - a.left === b.right - b.left;
}

function referenceTo(reference: Reference, target: Moved, home: Home, moved: Home): Reference {
  const place = (bound: Bound, at: number, to: number): Bound => ({
    at: bound.fixed ? at : at - to,
    fixed: bound.fixed,
  });
  const upsideDown = resolveBound(reference.top, home.row) > resolveBound(reference.bottom, home.row);
  const mirrored = resolveBound(reference.left, home.column) > resolveBound(reference.right, home.column);
  return {
    sheet: target.sheet ?? reference.sheet,
    top: place(reference.top, upsideDown ? target.bottom : target.top, moved.row),
    bottom: place(reference.bottom, upsideDown ? target.top : target.bottom, moved.row),
    left: place(reference.left, mirrored ? target.right : target.left, moved.column),
    right: place(reference.right, mirrored ? target.left : target.right, moved.column),
    whole: reference.whole,
  };
}

function sameReference(a: Reference, b: Reference): boolean {
  return (
    a.top.at === b.top.at &&
    a.bottom.at === b.bottom.at &&
    a.left.at === b.left.at &&
    a.right.at === b.right.at &&
    a.sheet === b.sheet
  );
}
