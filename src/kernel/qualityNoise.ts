import { speedOfLight } from "./constants.js";
import { isMagnitude } from "./domain.js";

/**
 * Photon noise of a radial velocity from the quality factor of the spectrum.
 *
 *     sigma = c / (Q N^(1/2))
 *
 * Given
 *   qualityFactor   [1]      scalar, > 0
 *   photoelectrons  [count]  scalar, > 0, in the whole spectrum
 * Returned  [m/s]; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/plan.test.ts
 * Source    Bouchy, Pepe & Queloz 2001, A&A 374, 733 (from memory)
 */
export function qualityNoise(qualityFactor: number, photoelectrons: number): number {
  if (!(isMagnitude(qualityFactor) && isMagnitude(photoelectrons))) return Number.NaN;
  return speedOfLight / (qualityFactor * Math.sqrt(photoelectrons));
}

/** `qualityNoise` of the first `rows` entries, to the same bits. */
export function qualityNoises(
  rows: number,
  out: Float64Array,
  qualityFactor: Float64Array,
  photoelectrons: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = qualityNoise(qualityFactor[row], photoelectrons[row]);
}
