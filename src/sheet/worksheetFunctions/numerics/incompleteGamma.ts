import { poissonDensity } from "./density.js";

const tiny = 1e-300;
const mostTerms = 50_000;

/** The two parts of the regularised incomplete gamma function: P(a, x) below x and Q(a, x) = 1 - P above. */
export interface IncompleteGamma {
  readonly below: number;
  readonly above: number;
}

/**
 * P and Q for a > 0, x >= 0, each without loss where it is the small one: the series of Abramowitz & Stegun 6.5.29
 * below x = a + 1, the continued fraction 6.5.31 above. NaN where neither settles (a beyond about 1e8).
 */
export function incompleteGamma(a: number, x: number): IncompleteGamma {
  if (x <= 0) {
    return { below: 0, above: 1 };
  }
  if (x < a + 1) {
    const below = series(a, x) * poissonDensity(a, x);
    return { below, above: 1 - below };
  }
  // x^a e^-x / Gamma(a) is a times the Poisson probability.
  const above = fraction(a, x) * a * poissonDensity(a, x);
  return { below: 1 - above, above };
}

function series(a: number, x: number): number {
  let term = 1;
  let total = 1;
  for (let index = 1; index < mostTerms; index++) {
    term *= x / (a + index);
    total += term;
    if (term < total * 1e-17) {
      return total;
    }
  }
  return Number.NaN;
}

function fraction(a: number, x: number): number {
  let b = x + 1 - a;
  let c = 1 / tiny;
  let d = 1 / b;
  let value = d;
  for (let index = 1; index < mostTerms; index++) {
    const an = -index * (index - a);
    b += 2;
    d = 1 / nonZero(an * d + b);
    c = nonZero(b + an / c);
    const factor = d * c;
    value *= factor;
    if (Math.abs(factor - 1) < 2e-16) {
      return value;
    }
  }
  return Number.NaN;
}

function nonZero(x: number): number {
  return Math.abs(x) < tiny ? tiny : x;
}
