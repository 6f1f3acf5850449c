import { stirlingError } from "./gamma.js";

/** x ln(x/m) + m - x without loss where x is near m (Loader 2000, "Fast and accurate computation of binomial probabilities"). */
function deviance(x: number, m: number): number {
  if (x === 0) {
    return m;
  }
  const difference = x - m;
  if (Math.abs(difference) >= 0.1 * (x + m)) {
    return x * Math.log(x / m) - difference;
  }
  const ratio = difference / (x + m);
  let term = 2 * x * ratio;
  let total = difference * ratio;
  for (let odd = 3; odd < 1000; odd += 2) {
    term *= ratio * ratio;
    const next = total + term / odd;
    if (next === total) {
      break;
    }
    total = next;
  }
  return total;
}

/** Poisson probability m^x e^-m / Gamma(x+1), for any real x >= 0. */
export function poissonDensity(x: number, m: number): number {
  if (m === 0) {
    return x === 0 ? 1 : 0;
  }
  if (x === 0) {
    return Math.exp(-m);
  }
  return Math.exp(-stirlingError(x) - deviance(x, m)) / Math.sqrt(2 * Math.PI * x);
}

/** Binomial probability of x in n with chance p (q = 1 - p), for any real 0 <= x <= n. */
export function binomialDensity(x: number, n: number, p: number, q: number): number {
  if (p === 0 || q === 0) {
    return x === (p === 0 ? 0 : n) ? 1 : 0;
  }
  if (x === 0) {
    return Math.exp(n * (p < 0.1 ? Math.log1p(-p) : Math.log(q)));
  }
  if (x === n) {
    return Math.exp(n * (q < 0.1 ? Math.log1p(-q) : Math.log(p)));
  }
  const exponent =
    stirlingError(n) - stirlingError(x) - stirlingError(n - x) - deviance(x, n * p) - deviance(n - x, n * q);
  return Math.exp(exponent) * Math.sqrt(n / (2 * Math.PI * x * (n - x)));
}
