import { speedOfLight } from "./constants.js";
import { isEccentricity, isMagnitude, isMagnitudeOrZero } from "./domain.js";

/**
 * Spectroscopic mass function: what a radial-velocity orbit alone says of the masses.
 *
 *     f = (GM_planet sin i)^3 / GM_total^2 = P K^3 ((1 - e)(1 + e))^(3/2) / (2 pi)
 *
 * Given
 *   amplitude     [m/s]  scalar, 0 <= K < c
 *   period        [s]    scalar, > 0
 *   eccentricity  [1]    scalar, 0 <= e < 1
 * Returned  [m3 s-2] as GM; 0 for K = 0; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15 at the eccentricity that is passed, up to e = 0.9999; test/kernel/reference.test.ts
 * Source    Lovis & Fischer 2010, in Exoplanets (ed. Seager), in GM form
 */
export function massFunction(amplitude: number, period: number, eccentricity: number): number {
  if (!(isMagnitudeOrZero(amplitude) && amplitude < speedOfLight)) return Number.NaN;
  if (!(isMagnitude(period) && isEccentricity(eccentricity))) return Number.NaN;
  const reduced = amplitude * Math.sqrt((1 - eccentricity) * (1 + eccentricity));
  return (period / (2 * Math.PI)) * reduced * reduced * reduced;
}

/** `massFunction` of the first `rows` entries, to the same bits. */
export function massFunctions(
  rows: number,
  out: Float64Array,
  amplitude: Float64Array,
  period: Float64Array,
  eccentricity: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = massFunction(amplitude[row], period[row], eccentricity[row]);
}
