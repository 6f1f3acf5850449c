import { speedOfLight } from "./constants.js";
import { isMagnitude, isMagnitudeOrZero } from "./domain.js";
import { speedPerMass } from "./speedPerMass.js";

/**
 * The star's mean orbital speed about the barycentre: that of the circular orbit of the same period.
 *
 *     v_star = 2 pi a_star / P = GM_planet (2 pi / (P GM_total^2))^(1/3),  GM_total = GM_star + GM_planet
 *
 * Given
 *   period      [s]       scalar, > 0
 *   starMass    [m3 s-2]  scalar, > 0: GM
 *   planetMass  [m3 s-2]  scalar, >= 0: GM
 * Returned  [m/s]; 0 for no planet; NaN outside the domain (see domain.ts) and where the speed would reach that of light
 * Accuracy  relative error <= 4e-15; test/kernel/reference.test.ts
 * Source    Kepler's third law and the balance of momenta; Murray & Correia 2010, in Exoplanets (ed. Seager)
 */
export function starSpeed(period: number, starMass: number, planetMass: number): number {
  if (!(isMagnitude(period) && isMagnitude(starMass) && isMagnitudeOrZero(planetMass))) return Number.NaN;
  const speed = planetMass * speedPerMass(period, starMass + planetMass);
  return speed < speedOfLight ? speed : Number.NaN;
}

/** `starSpeed` of the first `rows` entries, to the same bits. */
export function starSpeeds(
  rows: number,
  out: Float64Array,
  period: Float64Array,
  starMass: Float64Array,
  planetMass: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = starSpeed(period[row], starMass[row], planetMass[row]);
}
