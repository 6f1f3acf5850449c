import { type Cell, CellError } from "../call/cell.js";

/** How far a cell moved. */
export interface Change {
  /** After less before, where both are numbers. */
  readonly change: number | undefined;
  /** The change as a part of the value before; undefined where that is 0. */
  readonly relative: number | undefined;
  /** The change in units of the uncertainty before, or else after. */
  readonly sigmas: number | undefined;
}

export function changeOf(before: Cell, after: Cell, sigma: number | undefined): Change {
  if (typeof before !== "number" || typeof after !== "number") {
    return { change: undefined, relative: undefined, sigmas: undefined };
  }
  const change = after - before;
  return {
    change,
    relative: before === 0 ? undefined : change / Math.abs(before),
    sigmas: sigma === undefined ? undefined : change / sigma,
  };
}

/** Errors that say the same are the same. */
export function sameValue(before: Cell, after: Cell): boolean {
  if (before instanceof CellError && after instanceof CellError) {
    return before === after || (before.code === after.code && before.message === after.message);
  }
  return before === after;
}

/**
 * The order of importance: cells that became or ceased to be errors or blanks, then by size in units of the
 * uncertainty, then by relative size.
 */
export function byImportance(a: Change, b: Change): number {
  const kind = (a.change === undefined ? 0 : 1) - (b.change === undefined ? 0 : 1);
  return kind || sizeOf(b.sigmas) - sizeOf(a.sigmas) || sizeOf(b.relative) - sizeOf(a.relative);
}

function sizeOf(value: number | undefined): number {
  return Math.abs(value ?? 0);
}
