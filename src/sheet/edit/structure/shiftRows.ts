import type { Claim, SheetColumn, Spill } from "../../book/book.js";
import { noCells, piecesOf, spliceCells } from "../../book/cells.js";
import type { Span } from "../../book/spans.js";
import { cutSpans } from "../../book/spans.js";

/** A column with `count` blank rows put in before row `at`. */
export function insertIntoColumn(column: SheetColumn, at: number, count: number): SheetColumn {
  const { cells, runs } = column;
  const blank = piecesOf(noCells, 0, count);
  return {
    runs,
    cells: at < cells.length ? spliceCells(cells, at, at, blank) : cells,
    spills: shiftSpills(column.spills, at, count),
    claims: shiftClaims(column.claims, at, count),
  };
}

/** A column without `count` rows from row `at` on. */
export function deleteFromColumn(column: SheetColumn, at: number, count: number): SheetColumn {
  const { cells, runs } = column;
  const end = at + count;
  return {
    runs,
    cells: at < cells.length ? spliceCells(cells, at, Math.min(end, cells.length), []) : cells,
    spills: shiftSpills(cutSpans(column.spills, at, end), end, -count),
    claims: shiftClaims(cutSpans(column.claims, at, end), end, -count),
  };
}

function shiftSpills(spills: readonly Spill[], at: number, by: number): readonly Spill[] {
  return shiftSpans(spills, at, by);
}

function shiftClaims(claims: readonly Claim[], at: number, by: number): readonly Claim[] {
  return shiftSpans(claims, at, by).map((claim) =>
    claim.row !== undefined && claim.row >= at ? { ...claim, row: claim.row + by } : claim,
  );
}

/** Spans from row `at` on moved; one that reaches over that row is cut there. */
export function shiftSpans<S extends Span>(spans: readonly S[], at: number, by: number): readonly S[] {
  return spans.flatMap((span): S[] => {
    if (span.to <= at) {
      return [span];
    }
    if (span.from >= at) {
      return [{ ...span, from: span.from + by, to: span.to + by }];
    }
    return [
      { ...span, to: at },
      { ...span, from: at + by, to: span.to + by },
    ];
  });
}
