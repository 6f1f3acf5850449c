import { cos, sin } from "../angle.js";
import { day } from "../constants.js";
import { isEccentricity } from "../domain.js";
import { periodsBetween } from "../time/phase.js";
import { meanAnomalyAt, meanAnomalyAtTransit } from "./radialVelocity.js";

/*
 * The events of an orbit, as the number code the kernels take. At nu + omega = 90 deg the planet is in front of the star
 * and at 270 deg behind it; at 0 the star recedes fastest and at 180 deg it approaches fastest, and there, at the nodes,
 * lie the quadratures of an orbit seen edge-on.
 */
export const events = ["transit", "occultation", "rv-high", "rv-low", "quadrature", "periastron"] as const;
const atTransit = 0;
const atOccultation = 1;
const atHigh = 2;
const atLow = 3;
const atQuadrature = 4;
const atPeriastron = 5;

const turn = 2 * Math.PI;

/**
 * Part of the period from transit to an event, 0 to 1; to periastron the shorter way, -1/2 to 1/2, so that it does not
 * jump for an orbit that is nearly a circle.
 */
function partAfterTransit(which: number, eccentricity: number, omega: number): number {
  if (which === atTransit) return 0;
  const mean = meanAnomalyOfEvent(which, eccentricity, omega);
  const part = (mean - meanAnomalyAtTransit(eccentricity, omega)) / turn;
  return which === atPeriastron || part >= 0 ? part : part + 1;
}

function meanAnomalyOfEvent(which: number, eccentricity: number, omega: number): number {
  switch (which) {
    case atOccultation:
      return meanAnomalyAt(-cos(omega), -sin(omega), eccentricity);
    case atHigh:
      return meanAnomalyAt(-sin(omega), cos(omega), eccentricity);
    case atLow:
      return meanAnomalyAt(sin(omega), -cos(omega), eccentricity);
    case atPeriastron:
      return 0;
    default:
      return Number.NaN;
  }
}

/**
 * Which event it is that comes after an instant, counted from the reference time: whole periods, or for a quadrature half
 * ones, the even ones where the star approaches fastest (the first after a transit) and the odd ones where it recedes.
 *
 * Given
 *   which                           scalar, the place of the event in `events`
 *   after, reference  [d from J2000.0]  scalars, in one scale; the reference is a transit
 *   period            [s]           scalar, > 0
 *   eccentricity      [1]           scalar, 0 <= e < 1
 *   omega             [rad]         scalar: of the star's orbit
 *   place                           scalar, 1 for the first event after the instant, 2 for the one after it ...
 * Returned  [1], a whole number; NaN outside the domain
 */
export function eventNumber(
  which: number,
  after: number,
  period: number,
  reference: number,
  eccentricity: number,
  omega: number,
  place: number,
): number {
  if (!(isEccentricity(eccentricity) && Math.abs(omega) <= 100 && place >= 1 && place <= 1e9)) return Number.NaN;
  const each = which === atQuadrature ? 2 : 1;
  const passed = periodsBetween(after, period, reference);
  let number = Math.floor(passed) * each - each;
  if (Number.isNaN(number)) return Number.NaN;
  const time = () => eventTime(which, after, period, reference, eccentricity, omega, place, number);
  // From a period before: at most five steps. The time decides, so that the next event after an event is another.
  for (let step = 0; step < 3 * each + 1 && time() <= after; step++) number++;
  return number + place - 1;
}

/**
 * Time of an event of an orbit.
 *
 *     t = t0 + (n + part) P,  part that of the period from transit to the event
 *
 * Given
 *   as `eventNumber`, and
 *   number  [1]  scalar: which of the events; the one that `eventNumber` gives where left out
 * Returned  [d from J2000.0] in the scale of the reference; NaN outside the domain (see domain.ts)
 * Accuracy  that of the instants, and 1e-15 of a period; test/kernel/orbitalEvent.test.ts
 * Source    Winn 2010, in Exoplanets (ed. Seager), arXiv:1001.2010; the nodes from V = K (cos(nu + omega) + e cos omega)
 */
export function eventTime(
  which: number,
  after: number,
  period: number,
  reference: number,
  eccentricity: number,
  omega: number,
  place: number,
  number: number = eventNumber(which, after, period, reference, eccentricity, omega, place),
): number {
  const isQuadrature = which === atQuadrature;
  const whole = isQuadrature ? Math.floor(number / 2) : number;
  const kind = isQuadrature ? (number - 2 * whole === 0 ? atLow : atHigh) : which;
  const part = partAfterTransit(kind, eccentricity, omega);
  return reference + ((whole + part) * period) / day;
}

/** `eventNumber` of the first `rows` entries, to the same bits. */
export function eventNumbers(
  rows: number,
  out: Float64Array,
  which: Float64Array,
  after: Float64Array,
  period: Float64Array,
  reference: Float64Array,
  eccentricity: Float64Array,
  omega: Float64Array,
  place: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = eventNumber(
      which[row]!,
      after[row]!,
      period[row]!,
      reference[row]!,
      eccentricity[row]!,
      omega[row]!,
      place[row]!,
    );
  }
}

/** `eventTime` of the first `rows` entries, to the same bits. */
export function eventTimes(
  rows: number,
  out: Float64Array,
  which: Float64Array,
  after: Float64Array,
  period: Float64Array,
  reference: Float64Array,
  eccentricity: Float64Array,
  omega: Float64Array,
  place: Float64Array,
  number?: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = eventTime(
      which[row]!,
      after[row]!,
      period[row]!,
      reference[row]!,
      eccentricity[row]!,
      omega[row]!,
      place[row]!,
      number?.[row],
    );
  }
}
