import { day } from "../constants.js";
import { periodsBetween } from "../time/phase.js";

/**
 * How far an instant may move before the orbit bends [d]: the pace at periastron, which is the fastest.
 *
 *     (1 - e)^(3/2) P / (2 pi)
 */
export function bendOfTime(period: number, eccentricity: number): number {
  return ((period / (2 * Math.PI)) * (1 - eccentricity) * Math.sqrt(1 - eccentricity)) / day;
}

/** The same for the period [s], whose change counts once for every turn between two instants. */
export function bendOfPeriod(time: number, period: number, reference: number, eccentricity: number): number {
  const turns = Math.abs(periodsBetween(time, period, reference));
  return (bendOfTime(period, eccentricity) * day) / Math.max(1, turns);
}
