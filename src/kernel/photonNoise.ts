import { isMagnitude } from "./domain.js";
import { lightRatio } from "./lightRatio.js";

/**
 * Photon noise of a radial velocity, scaled from one that was measured with the same instrument on a star of the same kind.
 *
 *     sigma = sigma_a / (N / N_a)^(1/2),  N / N_a the ratio of photons, see lightRatio.ts
 *
 * Given
 *   magnitude        [mag]  scalar, -30 to 40, in one band with that of the anchor
 *   exposure         [s]    scalar, > 0
 *   anchorNoise      [m/s]  scalar, > 0: measured at
 *   anchorMagnitude  [mag]  scalar, -30 to 40, and
 *   anchorExposure   [s]    scalar, > 0
 *   aperture         [m]    scalar, > 0, or 0 for that of the anchor; then both are 0
 *   anchorAperture   [m]    scalar, like aperture
 * Returned  [m/s]; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/plan.test.ts
 * Source    Bouchy, Pepe & Queloz 2001, A&A 374, 733: sigma goes with the inverse root of the photons
 */
export function photonNoise(
  magnitude: number,
  exposure: number,
  anchorNoise: number,
  anchorMagnitude: number,
  anchorExposure: number,
  aperture: number,
  anchorAperture: number,
): number {
  if (!(isMagnitude(exposure) && isMagnitude(anchorNoise) && isMagnitude(anchorExposure))) return Number.NaN;
  const rate = lightRatio(magnitude, anchorMagnitude, aperture, anchorAperture);
  return anchorNoise / Math.sqrt((rate * exposure) / anchorExposure);
}

/** `photonNoise` of the first `rows` entries, to the same bits. */
export function photonNoises(
  rows: number,
  out: Float64Array,
  magnitude: Float64Array,
  exposure: Float64Array,
  anchorNoise: Float64Array,
  anchorMagnitude: Float64Array,
  anchorExposure: Float64Array,
  aperture: Float64Array,
  anchorAperture: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = photonNoise(
      magnitude[row],
      exposure[row],
      anchorNoise[row],
      anchorMagnitude[row],
      anchorExposure[row],
      aperture[row],
      anchorAperture[row],
    );
  }
}
