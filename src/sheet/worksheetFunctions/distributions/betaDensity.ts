import { binomialDensity } from "../numerics/density.js";

const infinity = Number.POSITIVE_INFINITY;

/** Density of the beta distribution on 0 to 1. */
export function betaDensity(x: number, a: number, b: number): number {
  if (x <= 0 || x >= 1) {
    const power = x <= 0 ? a : b;
    return x < 0 || x > 1 || power > 1 ? 0 : power === 1 ? (x <= 0 ? b : a) : infinity;
  }
  return (binomialDensity(a, a + b, x, 1 - x) * a * b) / ((a + b) * x * (1 - x));
}
