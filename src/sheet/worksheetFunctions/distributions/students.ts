import { define } from "../define/define.js";
import { logical, number, optional, whole } from "../define/parameters.js";
import { binomialDensity } from "../numerics/density.js";
import { incompleteBeta } from "../numerics/incompleteBeta.js";
import type { Tails } from "../numerics/quantile.js";
import { quantile } from "../numerics/quantile.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import type { Condition } from "./distribution.js";
import { aboveChance, atLeast, freedomOf, guarded, notNegative, openChance, positive } from "./distribution.js";

const infinity = Number.POSITIVE_INFINITY;

/** Both tails of Student's t beyond |t|, together. */
function beyond(t: number, freedom: number): number {
  const square = t * t;
  return incompleteBeta(freedom / (freedom + square), square / (freedom + square), freedom / 2, 0.5).below;
}

const studentBelow = (t: number, freedom: number) => (t < 0 ? beyond(t, freedom) / 2 : 1 - beyond(t, freedom) / 2);

/** (1 + t^2/n)^(-(n+1)/2) / (sqrt n B(n/2, 1/2)), the beta function from a binomial probability at its peak. */
function studentDensity(t: number, freedom: number): number {
  const [a, b] = [freedom / 2, 0.5];
  const q = b / (a + b);
  const peak = binomialDensity(a, a + b, 1 - q, q);
  const inverseBeta = ((a * b) / (a + b)) * peak * Math.exp(-a * Math.log1p(-q)) * q ** -b;
  return (Math.exp(-(a + b) * Math.log1p((t * t) / freedom)) * inverseBeta) / Math.sqrt(freedom);
}

/** The t that |t| exceeds with chance p. */
function studentTwoTailed(p: number, freedom: number): number {
  // In terms of the share the quantile is one of a beta distribution; t follows from both tails.
  const tails = (t: number): Tails => {
    const above = beyond(t, freedom);
    return { below: 1 - above, above };
  };
  return quantile(tails, aboveChance(p), 0, infinity);
}

const twoTailed = (name: string) =>
  define(name, [number("probability"), whole("degrees of freedom")] as const, (p, freedom) =>
    guarded(name, [{ ...openChance(p), holds: p > 0 && p <= 1 }, freedomOf(freedom)], () =>
      p === 1 ? 0 : studentTwoTailed(p, freedom),
    ),
  );

const tails = (name: string) =>
  define(name, [number("t"), whole("degrees of freedom"), whole("tails")] as const, (t, freedom, count) => {
    const known: Condition = {
      holds: count === 1 || count === 2,
      input: "tails",
      value: count,
      because: "neither 1 nor 2",
      needed: "1 or 2 is needed",
    };
    return guarded(name, [notNegative("t", t), freedomOf(freedom), known], () => (beyond(t, freedom) * count) / 2);
  });

/** Student's t: sections 6.18.77 and 6.18.78. */
export const students: readonly WorksheetFunction[] = [
  define(
    "T.DIST",
    [number("t"), whole("degrees of freedom"), optional(logical("cumulative"), true)] as const,
    (t, freedom, cumulative) =>
      guarded("T.DIST", [freedomOf(freedom)], () =>
        cumulative ? studentBelow(t, freedom) : studentDensity(t, freedom),
      ),
  ),
  define("T.DIST.RT", [number("t"), whole("degrees of freedom")] as const, (t, freedom) =>
    guarded("T.DIST.RT", [freedomOf(freedom)], () => studentBelow(-t, freedom)),
  ),
  define("T.DIST.2T", [number("t"), whole("degrees of freedom")] as const, (t, freedom) =>
    guarded("T.DIST.2T", [notNegative("t", t), freedomOf(freedom)], () => beyond(t, freedom)),
  ),
  define("T.INV", [number("probability"), whole("degrees of freedom")] as const, (p, freedom) =>
    guarded("T.INV", [openChance(p), freedomOf(freedom)], () =>
      p === 0.5 ? 0 : p < 0.5 ? -studentTwoTailed(2 * p, freedom) : studentTwoTailed(2 * (1 - p), freedom),
    ),
  ),
  twoTailed("T.INV.2T"),
  twoTailed("TINV"),
  tails("TDIST"),
  tails("LEGACY.TDIST"),
  define(
    "CONFIDENCE.T",
    [number("alpha"), number("standard deviation"), whole("size")] as const,
    (alpha, deviation, size) =>
      guarded(
        "CONFIDENCE.T",
        [openChance(alpha, "alpha"), positive("standard deviation", deviation), atLeast("size", size, 2)],
        () => (studentTwoTailed(alpha, size - 1) * deviation) / Math.sqrt(size),
      ),
  ),
];
