import { define } from "../define/define.js";
import { logical, number, optional, whole } from "../define/parameters.js";
import { poissonDensity } from "../numerics/density.js";
import { incompleteBeta } from "../numerics/incompleteBeta.js";
import { incompleteGamma } from "../numerics/incompleteGamma.js";
import type { Tails } from "../numerics/quantile.js";
import { quantile } from "../numerics/quantile.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import { betaDensity } from "./betaDensity.js";
import { aboveChance, belowChance, chance, freedomOf, guarded, notNegative, positive } from "./distribution.js";

const infinity = Number.POSITIVE_INFINITY;

const chiSquare =
  (freedom: number) =>
  (x: number): Tails =>
    incompleteGamma(freedom / 2, x / 2);

const chiSquareDensity = (x: number, freedom: number) => gammaDensity(x, freedom / 2, 2);

/** Density of the gamma distribution from a Poisson probability; 0 below 0. */
function gammaDensity(x: number, shape: number, scale: number): number {
  if (x < 0) {
    return 0;
  }
  if (x === 0) {
    return shape < 1 ? infinity : shape === 1 ? 1 / scale : 0;
  }
  return (poissonDensity(shape, x / scale) * shape) / x;
}

/** F ratio: the share x n1 / (x n1 + n2) follows a beta distribution. */
const fRatio =
  (n1: number, n2: number) =>
  (x: number): Tails =>
    incompleteBeta((n1 * x) / (n1 * x + n2), n2 / (n1 * x + n2), n1 / 2, n2 / 2);

function fDensity(x: number, n1: number, n2: number): number {
  if (x <= 0) {
    return x < 0 || n1 > 2 ? 0 : n1 === 2 ? 1 : infinity;
  }
  const total = n1 * x + n2;
  return (betaDensity((n1 * x) / total, n1 / 2, n2 / 2) * n1 * n2) / total ** 2;
}

const gammaFunctions = (suffix: { dist: string; inv: string }): WorksheetFunction[] => [
  define(
    suffix.dist,
    [number("x"), number("alpha"), number("beta"), optional(logical("cumulative"), true)] as const,
    (x, shape, scale, cumulative) =>
      guarded(suffix.dist, [notNegative("x", x), positive("alpha", shape), positive("beta", scale)], () =>
        cumulative ? incompleteGamma(shape, x / scale).below : gammaDensity(x, shape, scale),
      ),
  ),
  define(suffix.inv, [number("probability"), number("alpha"), number("beta")] as const, (p, shape, scale) =>
    guarded(suffix.inv, [chance("probability", p), positive("alpha", shape), positive("beta", scale)], () =>
      p === 0
        ? 0
        : p === 1
          ? infinity
          : scale * quantile((x) => incompleteGamma(shape, x), belowChance(p), 0, infinity),
    ),
  ),
];

const chiSquareRight = (name: string) =>
  define(name, [number("x"), whole("degrees of freedom")] as const, (x, freedom) =>
    guarded(name, [freedomOf(freedom)], () => chiSquare(freedom)(x).above),
  );

const chiSquareInverse = (name: string, right: boolean) =>
  define(name, [number("probability"), whole("degrees of freedom")] as const, (p, freedom) =>
    guarded(name, [chance("probability", p), freedomOf(freedom)], () =>
      p === (right ? 1 : 0)
        ? 0
        : p === (right ? 0 : 1)
          ? infinity
          : quantile(chiSquare(freedom), right ? aboveChance(p) : belowChance(p), 0, infinity),
    ),
  );

const chiSquareDistribution = (name: string) =>
  define(
    name,
    [number("x"), whole("degrees of freedom"), optional(logical("cumulative"), true)] as const,
    (x, freedom, cumulative) =>
      guarded(name, [freedomOf(freedom)], () =>
        x < 0 ? 0 : cumulative ? chiSquare(freedom)(x).below : chiSquareDensity(x, freedom),
      ),
  );

const chiSquares: WorksheetFunction[] = [
  chiSquareDistribution("CHISQ.DIST"),
  chiSquareDistribution("CHISQDIST"),
  ...["CHISQ.DIST.RT", "CHIDIST", "LEGACY.CHIDIST"].map(chiSquareRight),
  ...["CHISQ.INV", "CHISQINV"].map((name) => chiSquareInverse(name, false)),
  ...["CHISQ.INV.RT", "CHIINV", "LEGACY.CHIINV"].map((name) => chiSquareInverse(name, true)),
];

const freedoms = [
  whole("degrees of freedom of the numerator"),
  whole("degrees of freedom of the denominator"),
] as const;
const freedomConditions = (n1: number, n2: number) => [
  freedomOf(n1, "degrees of freedom of the numerator"),
  freedomOf(n2, "degrees of freedom of the denominator"),
];

const fRight = (name: string) =>
  define(name, [number("x"), ...freedoms] as const, (x, n1, n2) =>
    guarded(name, [notNegative("x", x), ...freedomConditions(n1, n2)], () => fRatio(n1, n2)(x).above),
  );

const fDistribution = (name: string) =>
  define(name, [number("x"), ...freedoms, optional(logical("cumulative"), true)] as const, (x, n1, n2, cumulative) =>
    guarded(name, freedomConditions(n1, n2), () =>
      x < 0 ? 0 : cumulative ? fRatio(n1, n2)(x).below : fDensity(x, n1, n2),
    ),
  );

const fInverse = (name: string, right: boolean) =>
  define(name, [number("probability"), ...freedoms] as const, (p, n1, n2) =>
    guarded(name, [chance("probability", p), ...freedomConditions(n1, n2)], () =>
      p === (right ? 1 : 0)
        ? 0
        : p === (right ? 0 : 1)
          ? infinity
          : quantile(fRatio(n1, n2), right ? aboveChance(p) : belowChance(p), 0, infinity),
    ),
  );

const fRatios: WorksheetFunction[] = [
  fDistribution("F.DIST"),
  ...["F.DIST.RT", "FDIST", "LEGACY.FDIST"].map(fRight),
  fInverse("F.INV", false),
  ...["F.INV.RT", "FINV", "LEGACY.FINV"].map((name) => fInverse(name, true)),
];

const exponential = (name: string) =>
  define(name, [number("x"), number("lambda"), optional(logical("cumulative"), true)] as const, (x, rate, cumulative) =>
    guarded(name, [notNegative("x", x), positive("lambda", rate)], () =>
      cumulative ? -Math.expm1(-rate * x) : rate * Math.exp(-rate * x),
    ),
  );

const weibull = (name: string) =>
  define(
    name,
    [number("x"), number("alpha"), number("beta"), optional(logical("cumulative"), true)] as const,
    (x, shape, scale, cumulative) =>
      guarded(name, [notNegative("x", x), positive("alpha", shape), positive("beta", scale)], () => {
        const power = (x / scale) ** shape;
        return cumulative ? -Math.expm1(-power) : (shape / scale) * (x / scale) ** (shape - 1) * Math.exp(-power);
      }),
  );

/** Continuous distributions of section 6.18 other than the normal. */
export const continuous: readonly WorksheetFunction[] = [
  ...gammaFunctions({ dist: "GAMMA.DIST", inv: "GAMMA.INV" }),
  ...gammaFunctions({ dist: "GAMMADIST", inv: "GAMMAINV" }),
  ...chiSquares,
  ...fRatios,
  exponential("EXPON.DIST"),
  exponential("EXPONDIST"),
  weibull("WEIBULL"),
  weibull("WEIBULL.DIST"),
];
