import { cubeRoot } from "./cubeRoot.js";
import { isMagnitude, isMagnitudeOrZero } from "./domain.js";

/**
 * Semi-major axis of the relative orbit (planet about star).
 *
 *     a = (GM_total (P / 2 pi)^2)^(1/3),  GM_total = GM_star + GM_planet
 *
 * Given
 *   period      [s]       scalar, > 0
 *   starMass    [m3 s-2]  scalar, > 0: GM
 *   planetMass  [m3 s-2]  scalar, >= 0: GM
 * Returned  [m]; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/reference.test.ts
 * Source    Kepler's third law in Newton's form; Murray & Correia 2010, in Exoplanets (ed. Seager)
 */
export function semiMajorAxis(period: number, starMass: number, planetMass: number): number {
  if (!(isMagnitude(period) && isMagnitude(starMass) && isMagnitudeOrZero(planetMass))) return Number.NaN;
  const timePerRadian = period / (2 * Math.PI);
  return cubeRoot((starMass + planetMass) * timePerRadian * timePerRadian);
}

/** `semiMajorAxis` of the first `rows` entries, to the same bits. */
export function semiMajorAxes(
  rows: number,
  out: Float64Array,
  period: Float64Array,
  starMass: Float64Array,
  planetMass: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = semiMajorAxis(period[row], starMass[row], planetMass[row]);
}
