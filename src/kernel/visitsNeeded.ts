import { isMagnitude } from "./domain.js";
import { samplingPower } from "./samplingPower.js";

/** Semi-amplitude and systemic velocity are fitted; two more visits let the fit show that it is wrong. */
export const fewestVisits = 4;

/** What a quotient that is whole can lie above itself by rounding. */
export const rounding = 1e-12;

/** Visits as a real number, before they are made whole: N = (n sigma / K)^2 / H. */
export function visitsExactly(
  amplitude: number,
  noise: number,
  significance: number,
  sampling: number,
  eccentricity: number,
  omega: number,
): number {
  if (!(isMagnitude(amplitude) && isMagnitude(noise) && isMagnitude(significance))) return Number.NaN;
  const ratio = (significance * noise) / amplitude;
  return (ratio * ratio) / samplingPower(sampling, eccentricity, omega);
}

/**
 * Whole visits that give what `exact` would. At the quadratures an odd one cannot be split in halves and N visits count
 * as N - 1/N.
 */
export function wholeVisits(exact: number, sampling: number): number {
  const least = Math.max(Math.ceil(exact * (1 - rounding)), fewestVisits);
  const isShort = sampling === 1 && least % 2 === 1 && least - 1 / least < exact * (1 - rounding);
  return isShort ? least + 1 : least;
}

/**
 * Visits that measure a semi-amplitude at a significance, period and times known, white noise.
 *
 *     N = (n sigma / K)^2 / H, rounded up;  H see samplingPower.ts
 *
 * Given
 *   amplitude     [m/s]  scalar, > 0: K
 *   noise         [m/s]  scalar, > 0: of one visit
 *   significance  [1]    scalar, > 0: n = K / sigma_K
 *   sampling      [1]    scalar: 0 uniform in time, 1 at the quadratures
 *   eccentricity  [1]    scalar, 0 <= e < 1
 *   omega         [rad]  scalar, of the star's orbit; any, also NaN, for a circle and at the quadratures
 * Returned  [1] a whole number, at least 4; NaN outside the domain (see domain.ts)
 * Accuracy  exact where the real number is not whole within 1e-12 of itself; test/kernel/plan.test.ts
 * Source    inverse Fisher matrix of semi-amplitude and systemic velocity (any statistics text)
 */
export function visitsNeeded(
  amplitude: number,
  noise: number,
  significance: number,
  sampling: number,
  eccentricity: number,
  omega: number,
): number {
  return wholeVisits(visitsExactly(amplitude, noise, significance, sampling, eccentricity, omega), sampling);
}

/** `visitsNeeded` of the first `rows` entries, to the same bits. */
export function visitsNeededs(rows: number, out: Float64Array, ...columns: Float64Array[]): void {
  visitsExactlys(rows, out, ...columns);
  const sampling = columns[3];
  for (let row = 0; row < rows; row++) out[row] = wholeVisits(out[row], sampling[row]);
}

/** `visitsExactly` of the first `rows` entries, to the same bits. */
export function visitsExactlys(rows: number, out: Float64Array, ...columns: Float64Array[]): void {
  const [amplitude, noise, significance, sampling, eccentricity, omega] = columns;
  for (let row = 0; row < rows; row++) {
    out[row] = visitsExactly(
      amplitude[row],
      noise[row],
      significance[row],
      sampling[row],
      eccentricity[row],
      omega[row],
    );
  }
}
