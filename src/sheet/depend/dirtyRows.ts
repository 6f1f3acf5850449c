import type { Span } from "../book/spans.js";
import type { Reference } from "../formula/reference.js";
import { resolveBound } from "../formula/reference.js";

/**
 * Of the rows of a run, those whose formula reads any of the rows `changed`. A reference whose edges are one fixed, one
 * relative can turn over: it then reaches from the lower edge to the upper.
 */
export function dirtyRows(reference: Reference, run: Span, changed: Span): Span {
  const { top, bottom } = reference;
  const upper = top.fixed ? (bottom.fixed ? undefined : top.at) : bottom.fixed ? bottom.at : undefined;
  if (upper !== undefined) {
    const moving = top.fixed ? bottom.at : top.at;
    return halfFixed(upper, moving, run, changed);
  }
  const low = Math.min(top.at, bottom.at);
  const high = Math.max(top.at, bottom.at);
  if (top.fixed) {
    return low < changed.to && high >= changed.from ? run : { from: run.from, to: run.from };
  }
  return clip(run, changed.from - high, changed.to - low);
}

function halfFixed(fixed: number, moving: number, run: Span, changed: Span): Span {
  if (fixed >= changed.from && fixed < changed.to) {
    return run;
  }
  return fixed >= changed.to
    ? clip(run, Number.NEGATIVE_INFINITY, changed.to - moving)
    : clip(run, changed.from - moving, Number.POSITIVE_INFINITY);
}

function clip(run: Span, from: number, to: number): Span {
  const low = Math.max(run.from, from);
  return { from: low, to: Math.max(low, Math.min(run.to, to)) };
}

/** The rows that a reference reads from anywhere in a run. */
export function rowsRead({ top, bottom }: Reference, run: Span): Span {
  const last = run.to - 1;
  const low = Math.min(resolveBound(top, run.from), resolveBound(bottom, run.from));
  const high = Math.max(resolveBound(top, last), resolveBound(bottom, last));
  // Edges only ever move down with the row, but one that moves can pass one that does not.
  return {
    from: Math.min(low, resolveBound(top, last), resolveBound(bottom, last)),
    to: Math.max(high, resolveBound(top, run.from), resolveBound(bottom, run.from)) + 1,
  };
}
