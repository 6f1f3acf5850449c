import { day } from "../constants.js";
import { isMagnitude } from "../domain.js";

/** Instants farther than this from J2000.0 [d] lie outside history; a double resolves 1e-9 d up to here. */
const farthest = 4e6;

export function isInstant(value: number): boolean {
  return Math.abs(value) <= farthest;
}

/**
 * Periods that have passed between two instants, whole ones and part.
 *
 *     (t - t0) / P
 *
 * Given
 *   time, reference  [d from J2000.0, in one scale]  scalars
 *   period           [s]                             scalar, > 0
 * Returned  [1]; NaN outside the domain (see domain.ts) and beyond 1e12 periods, where no phase is left
 * Accuracy  relative error <= 4e-16 of instants that are exact; one double holds an instant of our time to 1e-12 d
 * Source    definition
 */
export function periodsBetween(time: number, period: number, reference: number): number {
  if (!(isInstant(time) && isInstant(reference) && isMagnitude(period))) return Number.NaN;
  const periods = ((time - reference) * day) / period;
  return Math.abs(periods) <= 1e12 ? periods : Number.NaN;
}

/** Whole periods that have passed; a time that misses the next whole one by its rounding alone belongs to it. */
export function wholePeriods(time: number, period: number, reference: number): number {
  const periods = periodsBetween(time, period, reference);
  const whole = Math.floor(periods);
  return periods - whole < 1 ? whole : whole + 1;
}

/** What is left of periods when whole ones are taken off; 0 where it misses 0 by a rounding. */
export function partOf(periods: number, turns: number): number {
  const part = periods - turns;
  return part < 0 && part > -Number.EPSILON ? 0 : part;
}

/**
 * Phase: the part of a period that has passed since the last whole one.
 *
 * Given
 *   time       [d from J2000.0]  scalar
 *   period     [s]               scalar, > 0
 *   reference  [d from J2000.0]  scalar: an instant of phase 0, in the scale of the time
 *   turns      [1]               scalar: whole periods taken off, those that have passed where left out
 * Returned  [1], 0 <= phase < 1 for the whole periods that have passed; NaN outside the domain
 * Accuracy  that of the instants over the period; test/kernel/kepler.test.ts
 * Source    definition
 */
export function phase(
  time: number,
  period: number,
  reference: number,
  turns: number = wholePeriods(time, period, reference),
): number {
  return partOf(periodsBetween(time, period, reference), turns);
}

/** `phase` of the first `rows` entries, to the same bits. */
export function phases(
  rows: number,
  out: Float64Array,
  time: Float64Array,
  period: Float64Array,
  reference: Float64Array,
  turns?: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = phase(time[row]!, period[row]!, reference[row]!, turns?.[row]);
}

/** `wholePeriods` of the first `rows` entries, to the same bits. */
export function wholePeriodsOf(
  rows: number,
  out: Float64Array,
  time: Float64Array,
  period: Float64Array,
  reference: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = wholePeriods(time[row]!, period[row]!, reference[row]!);
}
