import { binomialDensity } from "./density.js";

const tiny = 1e-300;
const mostTerms = 50_000;

export interface IncompleteBeta {
  readonly below: number;
  readonly above: number;
}

/**
 * The regularised incomplete beta function I_x(a, b) below x and its complement above, y = 1 - x given apart so that
 * neither end loses digits. Continued fraction of DLMF 8.17.22, its factor from the binomial probability.
 */
export function incompleteBeta(x: number, y: number, a: number, b: number): IncompleteBeta {
  if (x <= 0) {
    return { below: 0, above: 1 };
  }
  if (y <= 0) {
    return { below: 1, above: 0 };
  }
  if (x * (a + b + 2) <= a + 1) {
    const below = tail(x, y, a, b);
    return { below, above: 1 - below };
  }
  const above = tail(y, x, b, a);
  return { below: 1 - above, above };
}

function tail(x: number, y: number, a: number, b: number): number {
  const factor = (b / (a + b)) * binomialDensity(a, a + b, x, y);
  return factor * fraction(x, a, b);
}

function fraction(x: number, a: number, b: number): number {
  let c = 1;
  let d = 1 / nonZero(1 - ((a + b) * x) / (a + 1));
  let value = d;
  for (let m = 1; m < mostTerms; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / nonZero(1 + even * d);
    c = nonZero(1 + even / c);
    value *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / nonZero(1 + odd * d);
    c = nonZero(1 + odd / c);
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
