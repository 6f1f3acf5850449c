import type { Cell } from "../../../call/cell.js";
import { define } from "../define/define.js";
import { logical, number, optional } from "../define/parameters.js";
import { incompleteBeta } from "../numerics/incompleteBeta.js";
import { quantile } from "../numerics/quantile.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import { betaDensity } from "./betaDensity.js";
import type { Condition } from "./distribution.js";
import { belowChance, chance, guarded, positive } from "./distribution.js";

const limits = [optional(number("lower limit"), 0), optional(number("upper limit"), 1)] as const;
const inLimits = (lower: number, upper: number): Condition => ({
  holds: lower < upper,
  input: "upper limit",
  value: upper,
  because: `not above the lower limit ${lower}`,
  needed: "a number above it is needed",
});

const betaValue = (
  name: string,
  x: number,
  a: number,
  b: number,
  lower: number,
  upper: number,
  cumulative: boolean,
): Cell => {
  const share = (x - lower) / (upper - lower);
  return guarded(name, [positive("alpha", a), positive("beta", b), inLimits(lower, upper)], () =>
    cumulative ? incompleteBeta(share, 1 - share, a, b).below : betaDensity(share, a, b) / (upper - lower),
  );
};

const betaInverse = (name: string) =>
  define(name, [number("probability"), number("alpha"), number("beta"), ...limits] as const, (p, a, b, lower, upper) =>
    guarded(
      name,
      [chance("probability", p), positive("alpha", a), positive("beta", b), inLimits(lower, upper)],
      () =>
        lower +
        (upper - lower) *
          (p === 0 || p === 1 ? p : quantile((x) => incompleteBeta(x, 1 - x, a, b), belowChance(p), 0, 1)),
    ),
  );

/** Sections 6.18.7 and 6.18.8. */
export const betas: readonly WorksheetFunction[] = [
  define(
    "BETADIST",
    [number("x"), number("alpha"), number("beta"), ...limits, optional(logical("cumulative"), true)] as const,
    (x, a, b, lower, upper, cumulative) => betaValue("BETADIST", x, a, b, lower, upper, cumulative),
  ),
  define(
    "BETA.DIST",
    [number("x"), number("alpha"), number("beta"), logical("cumulative"), ...limits] as const,
    (x, a, b, cumulative, lower, upper) => betaValue("BETA.DIST", x, a, b, lower, upper, cumulative),
  ),
  betaInverse("BETAINV"),
  betaInverse("BETA.INV"),
];
