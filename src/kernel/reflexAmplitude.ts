import { speedOfLight } from "./constants.js";
import { isEccentricity, isInclination, isMagnitude, isMagnitudeOrZero } from "./domain.js";
import { sine } from "./sine.js";
import { speedPerMass } from "./speedPerMass.js";

/**
 * Radial-velocity semi-amplitude of a star moved by one planet.
 *
 *     K = GM_planet sin i (2 pi / (P GM_total^2))^(1/3) / ((1 - e)(1 + e))^(1/2),  GM_total = GM_star + GM_planet
 *
 * Given
 *   period        [s]       scalar, > 0
 *   starMass      [m3 s-2]  scalar, > 0: GM
 *   planetMass    [m3 s-2]  scalar, >= 0: GM
 *   eccentricity  [1]       scalar, 0 <= e < 1
 *   inclination   [rad]     scalar, 0 < i < pi
 * Returned  [m/s]; 0 for no planet; NaN outside the domain (see domain.ts) and where K would reach the speed of light
 * Accuracy  relative error <= 4e-15 at the eccentricity that is passed, up to e = 0.9999; test/kernel/reference.test.ts
 * Source    Lovis & Fischer 2010, in Exoplanets (ed. Seager), eq. 14, in GM form
 */
export function reflexAmplitude(
  period: number,
  starMass: number,
  planetMass: number,
  eccentricity: number,
  inclination: number,
): number {
  if (!(isMagnitude(period) && isMagnitude(starMass) && isMagnitudeOrZero(planetMass))) return Number.NaN;
  if (!(isEccentricity(eccentricity) && isInclination(inclination))) return Number.NaN;
  const circular = planetMass * speedPerMass(period, starMass + planetMass);
  const amplitude = (circular * sine(inclination)) / Math.sqrt((1 - eccentricity) * (1 + eccentricity));
  return amplitude < speedOfLight ? amplitude : Number.NaN;
}

/** `reflexAmplitude` of the first `rows` entries, to the same bits. */
export function reflexAmplitudes(
  rows: number,
  out: Float64Array,
  period: Float64Array,
  starMass: Float64Array,
  planetMass: Float64Array,
  eccentricity: Float64Array,
  inclination: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = reflexAmplitude(period[row], starMass[row], planetMass[row], eccentricity[row], inclination[row]);
  }
}
