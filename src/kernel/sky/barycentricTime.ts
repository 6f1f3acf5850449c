import { day, speedOfLight } from "../constants.js";
import { isSite } from "./barycentricSpeed.js";
import { direction } from "./direction.js";
import { newObserver, observe } from "./observer.js";

const observer = newObserver();
const towards = new Float64Array(3);

/**
 * When the light that reaches a site would have passed the barycentre of the solar system, as plane waves.
 *
 *     BJD_TDB = TDB + r.n / c
 *
 * Left out: the bend of the wave front (below 1 ms for the nearest star) and the delay near the Sun (below 0.12 ms).
 *
 * Given
 *   time                         [d from J2000.0 UTC]  scalar, from 1972 up to 2036
 *   rightAscension, declination  [rad]  scalars, ICRS at the time
 *   longitude, latitude          [rad]  scalars, geodetic (WGS 84), east and north positive
 *   height                       [m]    scalar, above the ellipsoid
 * Returned  [d from J2000.0 TDB]; NaN outside the domain
 * Accuracy  2e-5 s for plane waves; test/kernel/barycentric.test.ts, test/astropy/barycentric.test.ts
 * Source    Eastman, Siverd & Gaudi 2010, PASP 122, 935
 */
export function barycentricTime(
  time: number,
  rightAscension: number,
  declination: number,
  longitude: number,
  latitude: number,
  height: number,
): number {
  if (!isSite(longitude, latitude, height)) return Number.NaN;
  observe(time, longitude, latitude, height, observer);
  const { state, tdb } = observer;
  direction(rightAscension, declination, 0, 0, 0, 0, tdb, state, towards);
  const way = state[0]! * towards[0]! + state[1]! * towards[1]! + state[2]! * towards[2]!;
  return tdb + way / speedOfLight / day;
}

/** `barycentricTime` of the first `rows` entries, to the same bits. */
export function barycentricTimes(
  rows: number,
  out: Float64Array,
  time: Float64Array,
  rightAscension: Float64Array,
  declination: Float64Array,
  longitude: Float64Array,
  latitude: Float64Array,
  height: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = barycentricTime(
      time[row]!,
      rightAscension[row]!,
      declination[row]!,
      longitude[row]!,
      latitude[row]!,
      height[row]!,
    );
  }
}
