import { relativistic } from "./dopplerModel.js";
import { planetMass } from "./planetMass.js";
import { speedOfShift } from "./speedOfShift.js";

/**
 * Planet mass from the measured amplitude of its star's fractional wavelength shift: the inverse of `planetShift`.
 *
 *     K = c z (2 + z) / (1 + (1 + z)^2),  mass from `planetMass`
 *
 * Given
 *   shift         [1]       scalar, z >= 0: at the greatest speed of recession, relative to the mean velocity
 *   period        [s]       scalar, > 0
 *   starMass      [m3 s-2]  scalar, > 0: GM
 *   eccentricity  [1]       scalar, 0 <= e < 1
 *   inclination   [rad]     scalar, 0 < i < pi
 * Returned  [m3 s-2] GM; 0 for z = 0; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15 at the eccentricity that is passed, up to e = 0.9999; test/kernel/reference.test.ts
 * Source    Einstein 1905; binary mass function, Lovis & Fischer 2010, in Exoplanets (ed. Seager)
 */
export function shiftMass(
  shift: number,
  period: number,
  starMass: number,
  eccentricity: number,
  inclination: number,
): number {
  return planetMass(speedOfShift(shift, relativistic), period, starMass, eccentricity, inclination);
}

/** `shiftMass` of the first `rows` entries, to the same bits. */
export function shiftMasses(
  rows: number,
  out: Float64Array,
  shift: Float64Array,
  period: Float64Array,
  starMass: Float64Array,
  eccentricity: Float64Array,
  inclination: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = shiftMass(shift[row], period[row], starMass[row], eccentricity[row], inclination[row]);
  }
}
