import { isMagnitude } from "./domain.js";
import { samplingPower } from "./samplingPower.js";

/**
 * Significance of a semi-amplitude after some visits, period and times known, white noise.
 *
 *     K / sigma_K = (K / sigma) (N H)^(1/2);  H see samplingPower.ts; an odd number at the quadratures counts as N - 1/N
 *
 * Given
 *   amplitude     [m/s]  scalar, > 0: K
 *   noise         [m/s]  scalar, > 0: of one visit
 *   visits        [1]    scalar, >= 2
 *   sampling      [1]    scalar: 0 uniform in time, 1 at the quadratures
 *   eccentricity  [1]    scalar, 0 <= e < 1
 *   omega         [rad]  scalar, of the star's orbit; any, also NaN, for a circle and at the quadratures
 * Returned  [1]; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/plan.test.ts
 * Source    inverse Fisher matrix of semi-amplitude and systemic velocity (any statistics text)
 */
export function visitSignificance(
  amplitude: number,
  noise: number,
  visits: number,
  sampling: number,
  eccentricity: number,
  omega: number,
): number {
  if (!(isMagnitude(amplitude) && isMagnitude(noise) && isMagnitude(visits) && visits >= 2)) return Number.NaN;
  const counting = sampling === 1 && visits % 2 === 1 ? visits - 1 / visits : visits;
  return (amplitude / noise) * Math.sqrt(counting * samplingPower(sampling, eccentricity, omega));
}

/** `visitSignificance` of the first `rows` entries, to the same bits. */
export function visitSignificances(rows: number, out: Float64Array, ...columns: Float64Array[]): void {
  const [amplitude, noise, visits, sampling, eccentricity, omega] = columns;
  for (let row = 0; row < rows; row++) {
    out[row] = visitSignificance(amplitude[row], noise[row], visits[row], sampling[row], eccentricity[row], omega[row]);
  }
}
