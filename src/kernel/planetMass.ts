import { speedOfLight } from "./constants.js";
import { cubeRoot } from "./cubeRoot.js";
import { isEccentricity, isInclination, isMagnitude, isMagnitudeOrZero } from "./domain.js";
import { sine } from "./sine.js";

/**
 * Planet mass from the radial-velocity semi-amplitude of its star: the inverse of `reflexAmplitude`, planet's own mass
 * in the total included. At sin i = 1 it is the minimum mass.
 *
 *     y = K ((1 - e)(1 + e))^(1/2) (P / (2 pi GM_star))^(1/3) / sin i
 *     x = GM_planet / GM_star is the one positive root of x^3 = y^3 (1 + x)^2
 *     with u = (1 + x)^(1/3):  u^3 - y u^2 - 1 = 0,  x = y u^2
 *     C = ((2 y^3 + 27 + (27 (4 y^3 + 27))^(1/2)) / 2)^(1/3),  u = (y + C + y^2 / C) / 3
 *
 * Every term is positive, so nothing cancels, from a pebble to a companion heavier than the star.
 *
 * Given
 *   amplitude     [m/s]     scalar, 0 <= K < c
 *   period        [s]       scalar, > 0
 *   starMass      [m3 s-2]  scalar, > 0: GM
 *   eccentricity  [1]       scalar, 0 <= e < 1
 *   inclination   [rad]     scalar, 0 < i < pi
 * Returned  [m3 s-2] GM; 0 for K = 0; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15 at the eccentricity that is passed, up to e = 0.9999; test/kernel/reference.test.ts
 * Source    binary mass function, Lovis & Fischer 2010, in Exoplanets (ed. Seager); its root by Cardano's formula
 */
export function planetMass(
  amplitude: number,
  period: number,
  starMass: number,
  eccentricity: number,
  inclination: number,
): number {
  if (!(isMagnitudeOrZero(amplitude) && amplitude < speedOfLight)) return Number.NaN;
  if (!(isMagnitude(period) && isMagnitude(starMass))) return Number.NaN;
  if (!(isEccentricity(eccentricity) && isInclination(inclination))) return Number.NaN;
  const reduced = amplitude * Math.sqrt((1 - eccentricity) * (1 + eccentricity));
  const y = (reduced * cubeRoot(period / (2 * Math.PI * starMass))) / sine(inclination);
  const cube = y * y * y;
  const c = cubeRoot((2 * cube + 27 + Math.sqrt(27 * (4 * cube + 27))) / 2);
  const u = (y + c + (y * y) / c) / 3;
  return starMass * y * u * u;
}

/** `planetMass` of the first `rows` entries, to the same bits. */
export function planetMasses(
  rows: number,
  out: Float64Array,
  amplitude: Float64Array,
  period: Float64Array,
  starMass: Float64Array,
  eccentricity: Float64Array,
  inclination: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = planetMass(amplitude[row], period[row], starMass[row], eccentricity[row], inclination[row]);
  }
}
