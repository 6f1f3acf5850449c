import { altitudeOf } from "./altitude.js";
import { newOrientation, orientationAt } from "./starOfDate.js";
import { sunDirection } from "./sun.js";

const orientation = newOrientation();
const sun = new Float64Array(3);

/** A stretch of time [d from J2000.0 UTC]. */
export interface Span {
  readonly from: number;
  readonly to: number;
}

/** One turn of the stars [d]. */
export const siderealDay = 0.9972695663290843;

/** Turns of sidereal time [rad/d]. */
export const siderealRate = (2 * Math.PI) / siderealDay;

/** Steps in which the Sun is looked at: it cannot go down and up again between two [d]. */
const step = 1 / 96;

/**
 * When it is dark in one night, from one mean noon to the next.
 *
 * Given
 *   noon                 [d from J2000.0 UTC]  scalar: mean noon at the site before the night
 *   longitude, latitude  [rad]  scalars
 *   sunBelow             [rad]  scalar: the Sun's altitude under which it is dark, -18 deg for astronomical twilight
 * Returned  the stretches of darkness, none in a white night; the whole of it in the polar night
 * Accuracy  4 s at middle latitudes, from that of the Sun; test/kernel/night.test.ts
 * Source    see sun.ts
 */
export function darkness(noon: number, longitude: number, latitude: number, sunBelow: number): Span[] {
  orientationAt(noon + 0.5, orientation);
  const midnight = orientation.sidereal + longitude;
  const above = (time: number) => {
    sunDirection(time, sun);
    return altitudeOf(sun, midnight + siderealRate * (time - noon - 0.5), latitude) - sunBelow;
  };
  return spansBelow(above, noon, noon + 1);
}

/** Where a function of time is below 0, its changes of sign found to 0.01 s. */
function spansBelow(value: (time: number) => number, from: number, to: number): Span[] {
  const spans: Span[] = [];
  let start = value(from) < 0 ? from : undefined;
  let before = from;
  const steps = Math.round((to - from) / step);
  for (let count = 1; count <= steps; count++) {
    const time = count === steps ? to : from + count * step;
    const isBelow = value(time) < 0;
    if (isBelow !== (start !== undefined)) {
      const change = changeBetween(value, before, time);
      if (start === undefined) start = change;
      else {
        spans.push({ from: start, to: change });
        start = undefined;
      }
    }
    before = time;
  }
  if (start !== undefined) spans.push({ from: start, to });
  return spans;
}

function changeBetween(value: (time: number) => number, from: number, to: number): number {
  let low = from;
  let high = to;
  const first = value(low) < 0;
  while (high - low > 1e-7) {
    const middle = (low + high) / 2;
    if (value(middle) < 0 === first) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/**
 * Mean noon at a site before the night that begins on a date there.
 *
 * Given
 *   date       [d from J2000.0]  scalar: any time of that date
 *   longitude  [rad]             scalar, east positive
 * Returned  [d from J2000.0 UTC]
 */
export function noonBefore(date: number, longitude: number): number {
  const midnight = Math.floor(date + 0.5) - 0.5;
  const east = longitude - 2 * Math.PI * Math.round(longitude / (2 * Math.PI));
  return midnight + 0.5 - east / (2 * Math.PI);
}
