import { complementaryErrorFunction } from "./errorFunction.js";

export function normalDensity(z: number): number {
  return Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
}

/** Chance below z of a standard normal variable. */
export function normalBelow(z: number): number {
  return complementaryErrorFunction(-z / Math.SQRT2) / 2;
}

/**
 * The z below which a standard normal variable lies with chance p, 0 < p < 1: the start of Abramowitz & Stegun
 * 26.2.23, then Newton steps of third order on the smaller tail.
 */
export function normalQuantile(p: number): number {
  const tail = Math.min(p, 1 - p);
  const t = Math.sqrt(-2 * Math.log(tail));
  let z = t - (2.515517 + t * (0.802853 + t * 0.010328)) / (1 + t * (1.432788 + t * (0.189269 + t * 0.001308)));
  for (let step = 0; step < 4; step++) {
    const error = (complementaryErrorFunction(z / Math.SQRT2) / 2 - tail) / normalDensity(z);
    z += error / (1 - (z * error) / 2);
  }
  return p < 0.5 ? -z : z + 0;
}
