import type { RangeA1 } from "@borgar/fx";
import { parseA1Ref, stringifyA1Ref, stringifyR1C1Ref } from "@borgar/fx";
import { mostColumns, mostRows } from "../limits.js";

/** One edge of a reference: `$` fixed, or so many rows or columns away from the cell of the formula. */
export interface Bound {
  readonly at: number;
  readonly fixed: boolean;
}

/** Cells that a formula names, seen from the cell of the formula. */
export interface Reference {
  /** As written; undefined is the sheet of the formula. */
  readonly sheet: string | undefined;
  readonly top: Bound;
  readonly bottom: Bound;
  readonly left: Bound;
  readonly right: Bound;
  /** `A:B` reaches over all rows, `1:2` over all columns. */
  readonly whole: "columns" | "rows" | undefined;
}

/** A rectangle without its sheet, both corners inside. */
export interface Rectangle {
  readonly top: number;
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
}

export function readReference(text: string, row: number, column: number): Reference | undefined {
  const parsed = parseA1Ref(text, { allowNamed: false });
  if (parsed === undefined || !("range" in parsed) || (parsed.context?.length ?? 0) > 1) {
    return undefined;
  }
  const { range } = parsed;
  const bound = (at: number, fixed: boolean | null | undefined, home: number): Bound =>
    fixed ? { at, fixed: true } : { at: at - home, fixed: false };
  const edge = (at: number): Bound => ({ at, fixed: true });
  const wholeColumns = range.top === null;
  const wholeRows = range.left === null;
  const sheet = parsed.context?.[0];
  if (sheet?.includes(":") || range.trim) {
    return undefined;
  }
  return {
    sheet,
    top: wholeColumns ? edge(0) : bound(range.top as number, range.$top, row),
    bottom: wholeColumns ? edge(mostRows - 1) : bound(range.bottom ?? (range.top as number), range.$bottom, row),
    left: wholeRows ? edge(0) : bound(range.left as number, range.$left, column),
    right: wholeRows ? edge(mostColumns - 1) : bound(range.right ?? (range.left as number), range.$right, column),
    whole: wholeColumns ? "columns" : wholeRows ? "rows" : undefined,
  };
}

export function resolveBound(bound: Bound, home: number): number {
  return bound.fixed ? bound.at : bound.at + home;
}

/** The rectangle a reference means in the formula of one cell. */
export function resolve(reference: Reference, row: number, column: number): Rectangle {
  const top = resolveBound(reference.top, row);
  const bottom = resolveBound(reference.bottom, row);
  const left = resolveBound(reference.left, column);
  const right = resolveBound(reference.right, column);
  return {
    top: Math.min(top, bottom),
    bottom: Math.max(top, bottom),
    left: Math.min(left, right),
    right: Math.max(left, right),
  };
}

export function isOnSheet(area: Rectangle): boolean {
  return area.top >= 0 && area.left >= 0 && area.bottom < mostRows && area.right < mostColumns;
}

/** The reference as the formula of one cell shows it: "Sheet2!B$1:F$1", the upper left corner first. */
export function referenceText(reference: Reference, row: number, column: number): string {
  const { whole } = reference;
  const [top, bottom] = inOrder(reference.top, reference.bottom, row);
  const [left, right] = inOrder(reference.left, reference.right, column);
  const range: RangeA1 = {
    top: whole === "columns" ? null : top.at,
    bottom: whole === "columns" ? null : bottom.at,
    left: whole === "rows" ? null : left.at,
    right: whole === "rows" ? null : right.at,
    $top: top.fixed,
    $bottom: bottom.fixed,
    $left: left.fixed,
    $right: right.fixed,
  };
  return stringifyA1Ref({ context: contextOf(reference), range });
}

/** Both edges where they are in one cell's formula. */
function inOrder(first: Bound, second: Bound, home: number): readonly [Bound, Bound] {
  const a = { at: resolveBound(first, home), fixed: first.fixed };
  const b = { at: resolveBound(second, home), fixed: second.fixed };
  const ordered = a.at < b.at || (a.at === b.at && (a.fixed || !b.fixed));
  return ordered ? [a, b] : [b, a];
}

/** The reference seen from its formula, in R1C1 form: the same for every row of a filled formula. */
export function relativeText(reference: Reference): string {
  const { whole, top, bottom, left, right } = reference;
  return stringifyR1C1Ref({
    context: contextOf(reference),
    range: {
      r0: whole === "columns" ? null : top.at,
      r1: whole === "columns" ? null : bottom.at,
      c0: whole === "rows" ? null : left.at,
      c1: whole === "rows" ? null : right.at,
      $r0: top.fixed,
      $r1: bottom.fixed,
      $c0: left.fixed,
      $c1: right.fixed,
    },
  });
}

function contextOf(reference: Reference): string[] {
  return reference.sheet === undefined ? [] : [reference.sheet];
}
