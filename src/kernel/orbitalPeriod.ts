import { isMagnitude, isMagnitudeOrZero } from "./domain.js";

/**
 * Orbital period.
 *
 *     P = 2 pi a (a / GM_total)^(1/2),  GM_total = GM_star + GM_planet
 *
 * Given
 *   axis        [m]       scalar, > 0: semi-major axis of the relative orbit
 *   starMass    [m3 s-2]  scalar, > 0: GM
 *   planetMass  [m3 s-2]  scalar, >= 0: GM
 * Returned  [s]; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/reference.test.ts
 * Source    Kepler's third law in Newton's form; Murray & Correia 2010, in Exoplanets (ed. Seager)
 */
export function orbitalPeriod(axis: number, starMass: number, planetMass: number): number {
  if (!(isMagnitude(axis) && isMagnitude(starMass) && isMagnitudeOrZero(planetMass))) return Number.NaN;
  return 2 * Math.PI * axis * Math.sqrt(axis / (starMass + planetMass));
}

/** `orbitalPeriod` of the first `rows` entries, to the same bits. */
export function orbitalPeriods(
  rows: number,
  out: Float64Array,
  axis: Float64Array,
  starMass: Float64Array,
  planetMass: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = orbitalPeriod(axis[row], starMass[row], planetMass[row]);
}
