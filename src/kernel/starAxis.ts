import { cubeRoot } from "./cubeRoot.js";
import { isMagnitude, isMagnitudeOrZero } from "./domain.js";

/**
 * Semi-major axis of the star's own orbit about the barycentre.
 *
 *     a_star = a GM_planet / GM_total = GM_planet (P / (2 pi GM_total))^(2/3),  GM_total = GM_star + GM_planet
 *
 * Given
 *   period      [s]       scalar, > 0
 *   starMass    [m3 s-2]  scalar, > 0: GM
 *   planetMass  [m3 s-2]  scalar, >= 0: GM
 * Returned  [m]; 0 for no planet; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/reference.test.ts
 * Source    Kepler's third law and the balance of momenta; Murray & Correia 2010, in Exoplanets (ed. Seager)
 */
export function starAxis(period: number, starMass: number, planetMass: number): number {
  if (!(isMagnitude(period) && isMagnitude(starMass) && isMagnitudeOrZero(planetMass))) return Number.NaN;
  const ratio = period / (2 * Math.PI * (starMass + planetMass));
  return planetMass * cubeRoot(ratio * ratio);
}

/** `starAxis` of the first `rows` entries, to the same bits. */
export function starAxes(
  rows: number,
  out: Float64Array,
  period: Float64Array,
  starMass: Float64Array,
  planetMass: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = starAxis(period[row], starMass[row], planetMass[row]);
}
