import { relativistic } from "./dopplerModel.js";
import { reflexAmplitude } from "./reflexAmplitude.js";
import { shiftOfSpeed } from "./shiftOfSpeed.js";

/**
 * Fractional wavelength shift of the star's light when it recedes with the semi-amplitude K that its planet causes.
 *
 *     z = ((c + K) / (c - K))^(1/2) - 1,  K from `reflexAmplitude`
 *
 * Given
 *   period        [s]       scalar, > 0
 *   starMass      [m3 s-2]  scalar, > 0: GM
 *   planetMass    [m3 s-2]  scalar, >= 0: GM
 *   eccentricity  [1]       scalar, 0 <= e < 1
 *   inclination   [rad]     scalar, 0 < i < pi
 * Returned  [1]; 0 for no planet; NaN outside the domain (see domain.ts) and where K would reach the speed of light
 * Accuracy  relative error <= 4e-15 for K below 0.1 c; test/kernel/reference.test.ts
 * Source    Lovis & Fischer 2010, in Exoplanets (ed. Seager), eq. 14, in GM form; Einstein 1905
 */
export function planetShift(
  period: number,
  starMass: number,
  planetMass: number,
  eccentricity: number,
  inclination: number,
): number {
  return shiftOfSpeed(reflexAmplitude(period, starMass, planetMass, eccentricity, inclination), relativistic);
}

/** `planetShift` of the first `rows` entries, to the same bits. */
export function planetShifts(
  rows: number,
  out: Float64Array,
  period: Float64Array,
  starMass: Float64Array,
  planetMass: Float64Array,
  eccentricity: Float64Array,
  inclination: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = planetShift(period[row], starMass[row], planetMass[row], eccentricity[row], inclination[row]);
  }
}
