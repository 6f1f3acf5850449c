import { isApparentMagnitude, isMagnitude, isMagnitudeOrZero, isPart } from "./domain.js";
import { powerOfTen } from "./powerOfTen.js";

/**
 * Photons from a star of magnitude 0 above the atmosphere [m-2 s-1 m-1], in the order of `bands`: those of Bessell,
 * Castelli & Plez 1998, whose unit, photons cm-2 s-1 A-1, is 1e14 of these.
 */
const photonsOfMagnitudeZero = [756.1, 1392.6, 995.5, 702.0, 452.0, 193.1, 93.3, 43.6].map((flux) => flux * 1e14);

/** The bands by name; a kernel receives the place in this list. */
export const bands = ["U", "B", "V", "R", "I", "J", "H", "K"] as const;

/**
 * Photoelectrons from a star in a part of one band.
 *
 *     N = (pi/4)(D^2 - d^2) eta t F 10^(-0.4 (m + k X)) w,  F photons from a star of magnitude 0
 *
 * Given
 *   magnitude    [mag]  scalar, -30 to 40, in the band
 *   band         [1]    scalar: place in `bands`
 *   aperture     [m]    scalar, > 0: diameter D of the telescope
 *   throughput   [1]    scalar, 0 < eta <= 1, without the atmosphere where an extinction is given
 *   exposure     [s]    scalar, > 0
 *   bandWidth    [m]    scalar, > 0: width w in wavelength
 *   obstruction  [m]    scalar, 0 <= d < D
 *   extinction   [mag]  scalar, 0 to 40: k at airmass 1
 *   airmass      [1]    scalar, 1 to 40; any where there is no extinction
 * Returned  [count]; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 1e-14 of the formula, test/kernel/plan.test.ts; the fluxes have three to four digits
 * Source    Bessell, Castelli & Plez 1998, A&A 333, 231, photon fluxes
 */
export function photoelectrons(
  magnitude: number,
  band: number,
  aperture: number,
  throughput: number,
  exposure: number,
  bandWidth: number,
  obstruction: number,
  extinction: number,
  airmass: number,
): number {
  const flux = photonsOfMagnitudeZero[band];
  if (flux === undefined || !isApparentMagnitude(magnitude)) return Number.NaN;
  if (!(isMagnitude(aperture) && isPart(throughput) && isMagnitude(exposure) && isMagnitude(bandWidth))) {
    return Number.NaN;
  }
  if (!(isMagnitudeOrZero(obstruction) && obstruction < aperture)) return Number.NaN;
  if (!(extinction >= 0 && extinction <= 40)) return Number.NaN;
  if (extinction > 0 && !(airmass >= 1 && airmass <= 40)) return Number.NaN;
  const lost = extinction > 0 ? extinction * airmass : 0;
  if (lost > 100) return Number.NaN;
  const area = (Math.PI / 4) * (aperture - obstruction) * (aperture + obstruction);
  return area * throughput * exposure * bandWidth * flux * powerOfTen(-0.4 * (magnitude + lost));
}

/** `photoelectrons` of the first `rows` entries, to the same bits. */
export function photoelectronCounts(
  rows: number,
  out: Float64Array,
  magnitude: Float64Array,
  band: Float64Array,
  aperture: Float64Array,
  throughput: Float64Array,
  exposure: Float64Array,
  bandWidth: Float64Array,
  obstruction: Float64Array,
  extinction: Float64Array,
  airmass: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = photoelectrons(
      magnitude[row],
      band[row],
      aperture[row],
      throughput[row],
      exposure[row],
      bandWidth[row],
      obstruction[row],
      extinction[row],
      airmass[row],
    );
  }
}
