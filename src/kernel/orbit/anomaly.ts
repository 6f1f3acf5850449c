import { atan2, cos, sin } from "../angle.js";
import { isEccentricity } from "../domain.js";
import { partOf, periodsBetween, wholePeriods } from "../time/phase.js";
import { eccentricAnomaly } from "./eccentricAnomaly.js";

/*
 * Which anomaly, as the number code the kernels take: the true one, seen from the focus; the eccentric one, seen from the
 * centre; the mean one, which grows evenly with time.
 */
export const trueAnomaly = 0;
export const eccentric = 1;
export const mean = 2;

const turn = 2 * Math.PI;

/**
 * Anomaly at an instant.
 *
 *     M = 2 pi (t - t0) / P;  E - e sin E = M;  tan(nu/2) = ((1 + e) / (1 - e))^(1/2) tan(E/2)
 *
 * Given
 *   time          [d from J2000.0]  scalar
 *   period        [s]               scalar, > 0
 *   periastron    [d from J2000.0]  scalar, in the scale of the time
 *   eccentricity  [1]               scalar, 0 <= e < 1
 *   which                           scalar, 0 true, 1 eccentric, 2 mean
 *   turns         [1]               scalar: whole periods taken off, those that have passed where left out
 * Returned  [rad], 0 <= anomaly < 2 pi for the whole periods that have passed; NaN outside the domain (see domain.ts)
 * Accuracy  that of the instants; error <= 1e-15 besides, times dnu/dM; test/kernel/kepler.test.ts
 * Source    Kepler's equation, any text on celestial mechanics
 */
export function anomaly(
  time: number,
  period: number,
  periastron: number,
  eccentricity: number,
  which: number,
  turns: number = wholePeriods(time, period, periastron),
): number {
  if (!isEccentricity(eccentricity) || !(which === trueAnomaly || which === eccentric || which === mean)) {
    return Number.NaN;
  }
  const part = partOf(periodsBetween(time, period, periastron), turns);
  if (which === mean) return part * turn;
  // Kepler's equation is odd: what lies past apastron is as far before the next periastron.
  const whole = Math.round(part);
  const E = eccentricAnomaly((part - whole) * turn, eccentricity);
  if (which === eccentric) return E + whole * turn;
  const half = atan2(Math.sqrt(1 + eccentricity) * sin(E / 2), Math.sqrt(1 - eccentricity) * cos(E / 2));
  const angle = 2 * half + whole * turn;
  return angle >= turn && part < 1 ? 0 : angle;
}

/** `anomaly` of the first `rows` entries, to the same bits. */
export function anomalies(
  rows: number,
  out: Float64Array,
  time: Float64Array,
  period: Float64Array,
  periastron: Float64Array,
  eccentricity: Float64Array,
  which: Float64Array,
  turns?: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = anomaly(time[row]!, period[row]!, periastron[row]!, eccentricity[row]!, which[row]!, turns?.[row]);
  }
}
