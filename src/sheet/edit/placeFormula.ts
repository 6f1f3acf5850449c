import type { Run } from "../book/book.js";
import type { Formula } from "../formula/formula.js";
import { withReferences } from "../formula/formula.js";
import type { Reference } from "../formula/reference.js";
import { resolveBound } from "../formula/reference.js";
import { mostColumns, mostRows } from "../limits.js";

/**
 * A formula over rows `from` up to `to` of a column: one run, or more where it would reach over the edge of the sheet
 * in some rows; there the reference is gone for good.
 */
export function placeFormula(formula: Formula, column: number, from: number, to: number): Run[] {
  const valid = formula.references.map((reference) =>
    reference === undefined ? nowhere : validRows(reference, column),
  );
  const cuts = new Set([from, to]);
  for (const [first, end] of valid) {
    for (const cut of [first, end]) {
      if (cut > from && cut < to) {
        cuts.add(cut);
      }
    }
  }
  const rows = [...cuts].sort((a, b) => a - b);
  return rows.slice(0, -1).map((start, index) => {
    const alive = valid.map(([first, end]) => start >= first && start < end);
    const whole = alive.every((each, at) => each || formula.references[at] === undefined);
    const references = formula.references.map((each, at) => (alive[at] ? each : undefined));
    return {
      from: start,
      to: rows[index + 1] as number,
      formula: whole ? formula : withReferences(formula, references),
    };
  });
}

const nowhere = [0, 0] as const;

/** The rows of a column from which all of a reference lies on the sheet. */
function validRows(reference: Reference, column: number): readonly [number, number] {
  const { top, bottom, left, right } = reference;
  const columns = [resolveBound(left, column), resolveBound(right, column)];
  if (columns.some((each) => each < 0 || each >= mostColumns)) {
    return nowhere;
  }
  const moving = [top, bottom].filter(({ fixed }) => !fixed).map(({ at }) => at);
  return moving.length === 0 ? [0, mostRows] : [-Math.min(...moving), mostRows - Math.max(...moving)];
}
