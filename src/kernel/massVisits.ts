import { isMagnitude, isMagnitudeOrZero } from "./domain.js";
import { samplingPower } from "./samplingPower.js";
import { rounding, wholeVisits } from "./visitsNeeded.js";

/** Visits as a real number, before they are made whole. */
export function massVisitsExactly(
  amplitude: number,
  noise: number,
  starMass: number,
  starMassError: number,
  significance: number,
  sampling: number,
  eccentricity: number,
  omega: number,
): number {
  if (!(isMagnitude(amplitude) && isMagnitude(noise) && isMagnitude(significance))) return Number.NaN;
  if (!(isMagnitude(starMass) && isMagnitudeOrZero(starMassError))) return Number.NaN;
  const ofStar = ((2 / 3) * starMassError) / starMass;
  const goal = 1 / significance;
  if (!(ofStar < goal * (1 - rounding))) return Number.NaN;
  const ratio = noise / amplitude;
  return (ratio * ratio) / (samplingPower(sampling, eccentricity, omega) * (goal - ofStar) * (goal + ofStar));
}

/**
 * Visits that measure the mass of a planet at a significance, where the mass of its star is uncertain.
 *
 *     N = (sigma / K)^2 / (H (1/n^2 - (2 sigma_M / (3 M))^2)), rounded up;  H see samplingPower.ts
 *
 * Given
 *   amplitude      [m/s]     scalar, > 0: K
 *   noise          [m/s]     scalar, > 0: of one visit
 *   starMass       [m3 s-2]  scalar, > 0: GM
 *   starMassError  [m3 s-2]  scalar, >= 0: its standard uncertainty
 *   significance   [1]       scalar, > 0: n = m / sigma_m
 *   sampling       [1]       scalar: 0 uniform in time, 1 at the quadratures
 *   eccentricity   [1]       scalar, 0 <= e < 1
 *   omega          [rad]     scalar, of the star's orbit; any, also NaN, for a circle and at the quadratures
 * Returned  [1] a whole number, at least 4; NaN outside the domain (see domain.ts) and where no number of visits is enough
 * Accuracy  exact where the real number is not whole within 1e-12 of itself; test/kernel/plan.test.ts
 * Source    first-order propagation (JCGM 100:2008, 5.1.2) of m ~ K M^(2/3), the planet light beside its star
 */
export function massVisits(
  amplitude: number,
  noise: number,
  starMass: number,
  starMassError: number,
  significance: number,
  sampling: number,
  eccentricity: number,
  omega: number,
): number {
  return wholeVisits(
    massVisitsExactly(amplitude, noise, starMass, starMassError, significance, sampling, eccentricity, omega),
    sampling,
  );
}

/** `massVisits` of the first `rows` entries, to the same bits. */
export function massVisitsOf(rows: number, out: Float64Array, ...columns: Float64Array[]): void {
  massVisitsExactlys(rows, out, ...columns);
  const sampling = columns[5];
  for (let row = 0; row < rows; row++) out[row] = wholeVisits(out[row], sampling[row]);
}

/** `massVisitsExactly` of the first `rows` entries, to the same bits. */
export function massVisitsExactlys(rows: number, out: Float64Array, ...columns: Float64Array[]): void {
  const [amplitude, noise, starMass, starMassError, significance, sampling, eccentricity, omega] = columns;
  for (let row = 0; row < rows; row++) {
    out[row] = massVisitsExactly(
      amplitude[row],
      noise[row],
      starMass[row],
      starMassError[row],
      significance[row],
      sampling[row],
      eccentricity[row],
      omega[row],
    );
  }
}
