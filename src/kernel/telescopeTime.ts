import { isMagnitude, isMagnitudeOrZero, isPart } from "./domain.js";

/**
 * Telescope time of a number of visits.
 *
 *     T = N (t + o) / eta
 *
 * Given
 *   visits      [1]  scalar, > 0
 *   exposure    [s]  scalar, > 0: open shutter of one visit
 *   overhead    [s]  scalar, >= 0: of one visit
 *   efficiency  [1]  scalar, 0 < eta <= 1: part of the time given that can be used
 * Returned  [s]; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/plan.test.ts
 * Source    arithmetic
 */
export function telescopeTime(visits: number, exposure: number, overhead: number, efficiency: number): number {
  if (!(isMagnitude(visits) && isMagnitude(exposure) && isMagnitudeOrZero(overhead))) return Number.NaN;
  return isPart(efficiency) ? (visits * (exposure + overhead)) / efficiency : Number.NaN;
}

/** `telescopeTime` of the first `rows` entries, to the same bits. */
export function telescopeTimes(
  rows: number,
  out: Float64Array,
  visits: Float64Array,
  exposure: Float64Array,
  overhead: Float64Array,
  efficiency: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = telescopeTime(visits[row], exposure[row], overhead[row], efficiency[row]);
  }
}
