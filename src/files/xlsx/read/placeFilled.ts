import type { Claim, Run, Spill } from "../../../sheet/book/book.js";
import type { Span } from "../../../sheet/book/spans.js";
import { mergeSpans, spanAt, spansIn } from "../../../sheet/book/spans.js";
import { sameClaim, sameSpill } from "../../../sheet/calculate/placeSpill.js";

/** A formula that filled several cells, and the rectangle. */
export interface Filling {
  readonly row: number;
  readonly column: number;
  readonly rows: number;
  readonly width: number;
}

export interface Filled {
  readonly spills: readonly Spill[];
  readonly claims: readonly Claim[];
}

interface OwnedClaim extends Claim {
  readonly owner: Filling;
}

/**
 * What formulas filled, as the columns of a sheet keep it. Rectangles that overlap each other or a formula, as no
 * worksheet program leaves them, are left out and told: their formulas are to be calculated.
 */
export function placeFilled(
  fillings: readonly Filling[],
  runsOf: (column: number) => readonly Run[],
): { readonly columns: ReadonlyMap<number, Filled>; readonly refused: readonly Filling[] } {
  const claims = claimsOf(fillings);
  const refused = new Set<Filling>();
  for (const [column, list] of claims) {
    const runs = runsOf(column);
    let end = 0;
    for (const claim of list) {
      if (claim.from < end || spansIn(runs, claim.from, claim.to).length > 0) {
        refused.add(claim.owner);
      }
      end = Math.max(end, claim.to);
    }
  }
  for (const filling of fillings) {
    if (spanAt(runsOf(filling.column), filling.row) === undefined) {
      refused.add(filling);
    }
  }
  const good = fillings.filter((each) => !refused.has(each));
  const columns = new Map<number, { spills: Spill[]; claims: Claim[] }>();
  const at = (column: number) => {
    const known = columns.get(column) ?? { spills: [], claims: [] };
    columns.set(column, known);
    return known;
  };
  for (const { row, column, rows, width } of good) {
    at(column).spills.push({ from: row, to: row + 1, rows, width, blocked: false });
  }
  for (const [column, list] of claims) {
    const held = list.filter((each) => !refused.has(each.owner));
    if (held.length > 0) {
      at(column).claims = held.map(({ from, to, column: owner, row }): Claim => ({ from, to, column: owner, row }));
    }
  }
  const merged = [...columns].map(([column, { spills, claims: held }]): [number, Filled] => [
    column,
    { spills: mergeSpans(spills.sort(byStart), sameSpill), claims: mergeSpans(held, sameClaim) },
  ]);
  return { columns: new Map(merged), refused: [...refused] };
}

/** The cells besides those of the formulas, by column from top to bottom. */
function claimsOf(fillings: readonly Filling[]): ReadonlyMap<number, readonly OwnedClaim[]> {
  const claims = new Map<number, OwnedClaim[]>();
  for (const owner of fillings) {
    const { row, column, rows, width } = owner;
    for (let across = 0; across < width; across++) {
      const from = across === 0 ? row + 1 : row;
      if (from < row + rows) {
        const list = claims.get(column + across) ?? [];
        claims.set(column + across, list);
        list.push({ from, to: row + rows, column, row: rows === 1 ? undefined : row, owner });
      }
    }
  }
  for (const list of claims.values()) {
    list.sort(byStart);
  }
  return claims;
}

const byStart = (a: Span, b: Span): number => a.from - b.from;
