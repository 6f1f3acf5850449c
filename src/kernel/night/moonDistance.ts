import { atan2, cos, sin } from "../angle.js";
import { isNight, isPlace, isPoint } from "./altitude.js";
import { moonPosition } from "./moon.js";
import { newOrientation, orientationAt, starOfDate } from "./starOfDate.js";

const orientation = newOrientation();
const star = new Float64Array(3);
const moon = new Float64Array(3);

/**
 * The Moon as a site sees it, on the axes of date, in radii of the Earth; it stands up to 1 deg from where the geocentre
 * sees it.
 *
 * Given
 *   time      [d from J2000.0]  scalar
 *   sidereal  [rad]             scalar: local sidereal time
 *   latitude  [rad]             scalar
 *   out                         three numbers to fill
 */
export function moonFromSite(time: number, sidereal: number, latitude: number, out: Float64Array): void {
  moonPosition(time, out);
  out[0]! -= cos(latitude) * cos(sidereal);
  out[1]! -= cos(latitude) * sin(sidereal);
  out[2]! -= sin(latitude);
}

/** Angle between two vectors of any length [rad], as exact near 0 and pi as between. */
export function angleBetween(a: Float64Array, b: Float64Array): number {
  const x = a[1]! * b[2]! - a[2]! * b[1]!;
  const y = a[2]! * b[0]! - a[0]! * b[2]!;
  const z = a[0]! * b[1]! - a[1]! * b[0]!;
  return atan2(Math.sqrt(x * x + y * y + z * z), a[0]! * b[0]! + a[1]! * b[1]! + a[2]! * b[2]!);
}

/**
 * Angle between a star and the Moon as a site sees them, whether or not they are up.
 *
 * Given
 *   time                         [d from J2000.0 UTC]  scalar, 1900 to 2100
 *   rightAscension, declination  [rad]  scalars, ICRS, at the time
 *   longitude, latitude          [rad]  scalars, geodetic (WGS 84), east and north positive
 * Returned  [rad], 0 to pi; NaN outside the domain
 * Accuracy  0.1 deg from 1972 to 2050; test/kernel/night.test.ts
 * Source    see moon.ts
 */
export function moonDistance(
  time: number,
  rightAscension: number,
  declination: number,
  longitude: number,
  latitude: number,
): number {
  if (!(isNight(time) && isPlace(rightAscension, declination) && isPoint(longitude, latitude))) return Number.NaN;
  orientationAt(time, orientation);
  starOfDate(rightAscension, declination, orientation, star);
  moonFromSite(time, orientation.sidereal + longitude, latitude, moon);
  return angleBetween(star, moon);
}

/** `moonDistance` of the first `rows` entries, to the same bits. */
export function moonDistances(
  rows: number,
  out: Float64Array,
  time: Float64Array,
  rightAscension: Float64Array,
  declination: Float64Array,
  longitude: Float64Array,
  latitude: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = moonDistance(time[row]!, rightAscension[row]!, declination[row]!, longitude[row]!, latitude[row]!);
  }
}
