import { isMagnitude } from "./domain.js";
import { lightRatio } from "./lightRatio.js";

/**
 * Exposure that brings the photon noise of a radial velocity down to a goal, scaled from one that was measured.
 *
 *     t = t_a (sigma_a / sigma)^2 / r,  r the ratio of photons a second, see lightRatio.ts
 *
 * Given
 *   noise            [m/s]  scalar, > 0: the goal
 *   magnitude        [mag]  scalar, -30 to 40, in one band with that of the anchor
 *   anchorNoise      [m/s]  scalar, > 0: measured at
 *   anchorMagnitude  [mag]  scalar, -30 to 40, and
 *   anchorExposure   [s]    scalar, > 0
 *   aperture         [m]    scalar, > 0, or 0 for that of the anchor; then both are 0
 *   anchorAperture   [m]    scalar, like aperture
 * Returned  [s]; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/plan.test.ts
 * Source    Bouchy, Pepe & Queloz 2001, A&A 374, 733: sigma goes with the inverse root of the photons
 */
export function exposureForNoise(
  noise: number,
  magnitude: number,
  anchorNoise: number,
  anchorMagnitude: number,
  anchorExposure: number,
  aperture: number,
  anchorAperture: number,
): number {
  if (!(isMagnitude(noise) && isMagnitude(anchorNoise) && isMagnitude(anchorExposure))) return Number.NaN;
  const times = anchorNoise / noise;
  return (anchorExposure * times * times) / lightRatio(magnitude, anchorMagnitude, aperture, anchorAperture);
}

/** `exposureForNoise` of the first `rows` entries, to the same bits. */
export function exposuresForNoises(
  rows: number,
  out: Float64Array,
  noise: Float64Array,
  magnitude: Float64Array,
  anchorNoise: Float64Array,
  anchorMagnitude: Float64Array,
  anchorExposure: Float64Array,
  aperture: Float64Array,
  anchorAperture: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = exposureForNoise(
      noise[row],
      magnitude[row],
      anchorNoise[row],
      anchorMagnitude[row],
      anchorExposure[row],
      aperture[row],
      anchorAperture[row],
    );
  }
}
