import { isApparentMagnitude, isMagnitude } from "./domain.js";
import { powerOfTen } from "./powerOfTen.js";

/**
 * Photons a second from one star through one telescope, relative to another star through another.
 *
 *     ratio = 10^(-0.4 (m - m_a)) (D / D_a)^2
 *
 * Given
 *   magnitude        [mag]  scalar, -30 to 40
 *   anchorMagnitude  [mag]  scalar, -30 to 40
 *   aperture         [m]    scalar, > 0, or 0 for that of the anchor; then both are 0
 *   anchorAperture   [m]    scalar, like aperture
 * Returned  [1]; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/plan.test.ts
 * Source    definition of magnitudes, Pogson 1856, MNRAS 17, 12
 */
export function lightRatio(
  magnitude: number,
  anchorMagnitude: number,
  aperture: number,
  anchorAperture: number,
): number {
  if (!(isApparentMagnitude(magnitude) && isApparentMagnitude(anchorMagnitude))) return Number.NaN;
  const ofBrightness = powerOfTen(-0.4 * (magnitude - anchorMagnitude));
  if (aperture === 0 && anchorAperture === 0) return ofBrightness;
  if (!(isMagnitude(aperture) && isMagnitude(anchorAperture))) return Number.NaN;
  const width = aperture / anchorAperture;
  return ofBrightness * width * width;
}
