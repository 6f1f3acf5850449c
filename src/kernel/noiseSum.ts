import { isMagnitudeOrZero } from "./domain.js";

/**
 * Independent noises added in quadrature.
 *
 *     sigma = (sigma_1^2 + sigma_2^2 + ...)^(1/2)
 *
 * Given
 *   noises  [m/s]  any number of scalars, >= 0
 * Returned  [m/s]; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15 for up to 16 terms; test/kernel/plan.test.ts
 * Source    addition of independent variances, JCGM 100:2008, 5.1.2
 */
export function noiseSum(...noises: number[]): number {
  let sum = 0;
  for (const noise of noises) {
    if (!isMagnitudeOrZero(noise)) return Number.NaN;
    sum += noise * noise;
  }
  return Math.sqrt(sum);
}

/** `noiseSum` of the first `rows` entries, to the same bits. */
export function noiseSums(rows: number, out: Float64Array, ...noises: Float64Array[]): void {
  out.fill(0, 0, rows);
  for (const noise of noises) {
    for (let row = 0; row < rows; row++) {
      const term = noise[row];
      out[row] += isMagnitudeOrZero(term) ? term * term : Number.NaN;
    }
  }
  for (let row = 0; row < rows; row++) out[row] = Math.sqrt(out[row]);
}
