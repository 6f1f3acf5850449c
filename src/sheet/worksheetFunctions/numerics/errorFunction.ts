import { incompleteGamma } from "./incompleteGamma.js";

/** erf(x), through P(1/2, x^2). */
export function errorFunction(x: number): number {
  const { below } = incompleteGamma(0.5, x * x);
  return x < 0 ? -below : below;
}

/** erfc(x) = 1 - erf(x), with full relative accuracy where it is small. */
export function complementaryErrorFunction(x: number): number {
  const { below, above } = incompleteGamma(0.5, x * x);
  return x < 0 ? 1 + below : above;
}
