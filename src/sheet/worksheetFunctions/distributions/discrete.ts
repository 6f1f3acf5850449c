import type { Cell } from "../../../call/cell.js";
import { define } from "../define/define.js";
import { logical, number, optional, whole } from "../define/parameters.js";
import { binomialDensity, poissonDensity } from "../numerics/density.js";
import { incompleteBeta } from "../numerics/incompleteBeta.js";
import { incompleteGamma } from "../numerics/incompleteGamma.js";
import { sumOf } from "../numerics/sum.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import { chance, firstProblem, notNegative, openChance, positive, upTo } from "./distribution.js";

/** Chance of at most k successes in n trials. */
function atMost(k: number, n: number, p: number): number {
  return k >= n ? 1 : k < 0 ? 0 : incompleteBeta(1 - p, p, n - k, k + 1).below;
}

const binomial = (name: string) =>
  define(
    name,
    [whole("successes"), whole("trials"), number("probability"), optional(logical("cumulative"), true)] as const,
    (k, n, p, cumulative): Cell =>
      firstProblem(name, [
        notNegative("trials", n),
        notNegative("successes", k),
        upTo("successes", k, n),
        chance("probability", p),
      ]) ?? (cumulative ? atMost(k, n, p) : binomialDensity(k, n, p, 1 - p)),
  );

/** The least k with a chance of at most k successes of alpha or more. */
function leastSuccesses(n: number, p: number, alpha: number): number {
  let low = 0;
  let high = n;
  while (low < high) {
    const middle = Math.floor((low + high) / 2);
    if (atMost(middle, n, p) >= alpha) {
      high = middle;
    } else {
      low = middle + 1;
    }
  }
  return low;
}

const binomialInverse = (name: string) =>
  define(
    name,
    [whole("trials"), number("probability"), number("alpha")] as const,
    (n, p, alpha): Cell =>
      firstProblem(name, [
        notNegative("trials", n),
        // Beyond, whole numbers are no longer doubles and a search would not end.
        upTo("trials", n, Number.MAX_SAFE_INTEGER),
        chance("probability", p),
        openChance(alpha, "alpha"),
      ]) ?? leastSuccesses(n, p, alpha),
  );

const binomialRange = (name: string) =>
  define(
    name,
    [
      whole("trials"),
      number("probability"),
      whole("least successes"),
      optional(whole("most successes"), Number.NaN),
    ] as const,
    (n, p, least, most): Cell => {
      const last = Number.isNaN(most) ? least : most;
      return (
        firstProblem(name, [
          notNegative("trials", n),
          chance("probability", p),
          notNegative("least successes", least),
          upTo("least successes", least, last),
          upTo("most successes", last, n),
        ]) ??
        (last - least < 1000
          ? sumOf(last - least + 1, (index) => binomialDensity(least + index, n, p, 1 - p))
          : atMost(last, n, p) - atMost(least - 1, n, p))
      );
    },
  );

const poisson = (name: string) =>
  define(
    name,
    [whole("events"), number("mean"), optional(logical("cumulative"), true)] as const,
    (k, mean, cumulative): Cell =>
      firstProblem(name, [notNegative("events", k), notNegative("mean", mean)]) ??
      (cumulative ? incompleteGamma(k + 1, mean).above : poissonDensity(k, mean)),
  );

/** Chance of f failures before success number s. */
const negativeBinomial = (name: string, cumulative: boolean) => {
  const inputs = [whole("failures"), whole("successes"), number("probability")] as const;
  const compute = (f: number, s: number, p: number, upToThere: boolean): Cell =>
    firstProblem(name, [notNegative("failures", f), positive("successes", s), chance("probability", p)]) ??
    (upToThere ? incompleteBeta(p, 1 - p, s, f + 1).below : (s / (s + f)) * binomialDensity(s, s + f, p, 1 - p));
  return cumulative
    ? define(name, [...inputs, logical("cumulative")] as const, compute)
    : define(name, inputs, (f, s, p) => compute(f, s, p, false));
};

function hypergeometricDensity(k: number, sample: number, marked: number, size: number): number {
  if (k < Math.max(0, sample + marked - size) || k > Math.min(sample, marked)) {
    return 0;
  }
  const p = sample / size;
  // Three binomial probabilities of one chance: the powers of the chance cancel (Loader 2000).
  return p === 1
    ? 1
    : (binomialDensity(k, marked, p, 1 - p) * binomialDensity(sample - k, size - marked, p, 1 - p)) /
        binomialDensity(sample, size, p, 1 - p);
}

/** Chance of at most k: the terms from k away from the mean, as many as count. */
function hypergeometricBelow(k: number, sample: number, marked: number, size: number): number {
  const step = k < (sample * marked) / size ? -1 : 1;
  let total = 0;
  for (let index = step < 0 ? k : k + 1; index >= 0 && index <= Math.min(sample, marked); index += step) {
    const term = hypergeometricDensity(index, sample, marked, size);
    total += term;
    if (term <= total * 1e-18) {
      break;
    }
  }
  return step < 0 ? total : 1 - total;
}

const hypergeometric = (name: string) =>
  define(
    name,
    [
      whole("successes in the sample"),
      whole("size of the sample"),
      whole("successes in all"),
      whole("size of all"),
      optional(logical("cumulative"), false),
    ] as const,
    (k, sample, marked, size, cumulative): Cell =>
      firstProblem(name, [
        notNegative("successes in the sample", k),
        positive("size of all", size),
        notNegative("size of the sample", sample),
        upTo("size of the sample", sample, size),
        notNegative("successes in all", marked),
        upTo("successes in all", marked, size),
        upTo("successes in the sample", k, sample),
      ]) ??
      (cumulative ? hypergeometricBelow(k, sample, marked, size) : hypergeometricDensity(k, sample, marked, size)),
  );

/** Sections 6.18.9, 6.18.10, 6.18.19, 6.18.37, 6.18.51 and 6.18.62. */
export const discrete: readonly WorksheetFunction[] = [
  binomial("BINOM.DIST"),
  binomial("BINOMDIST"),
  binomialInverse("BINOM.INV"),
  binomialInverse("CRITBINOM"),
  binomialRange("BINOM.DIST.RANGE"),
  poisson("POISSON"),
  poisson("POISSON.DIST"),
  negativeBinomial("NEGBINOM.DIST", true),
  negativeBinomial("NEGBINOMDIST", false),
  hypergeometric("HYPGEOM.DIST"),
  hypergeometric("HYPGEOMDIST"),
];
