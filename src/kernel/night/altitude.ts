import { atan2, cos, sin } from "../angle.js";
import { newOrientation, orientationAt, starOfDate } from "./starOfDate.js";

const orientation = newOrientation();
const star = new Float64Array(3);

/** Nights from 1900 to 2100 [d from J2000.0]: beyond, the precession of the short formulas is not to be trusted. */
export function isNight(time: number): boolean {
  return Math.abs(time) <= 36525;
}

/** [rad] A place in the sky, right ascension within a turn of 0. */
export function isPlace(rightAscension: number, declination: number): boolean {
  return Math.abs(rightAscension) <= 2 * Math.PI * (1 + 1e-12) && Math.abs(declination) <= (Math.PI / 2) * (1 + 1e-12);
}

/** [rad] A point on the Earth, longitude within a turn of Greenwich. */
export const isPoint = isPlace;

/**
 * Altitude of a direction of date.
 *
 *     sin h = sin phi sin delta + cos phi cos delta cos H
 *
 * Given
 *   direction  unit vector or any multiple of it, on the axes of date
 *   sidereal   [rad]  scalar: local sidereal time
 *   latitude   [rad]  scalar, geodetic
 * Returned  [rad]
 */
export function altitudeOf(direction: Float64Array, sidereal: number, latitude: number): number {
  const [c, s] = [cos(sidereal), sin(sidereal)];
  const towards = direction[0]! * c + direction[1]! * s;
  const east = direction[1]! * c - direction[0]! * s;
  const up = sin(latitude) * direction[2]! + cos(latitude) * towards;
  const north = cos(latitude) * direction[2]! - sin(latitude) * towards;
  return atan2(up, Math.sqrt(north * north + east * east));
}

/**
 * Altitude of a star above the horizon, without refraction.
 *
 * Given
 *   time                         [d from J2000.0 UTC]  scalar, 1900 to 2100
 *   rightAscension, declination  [rad]  scalars, ICRS, at the time
 *   longitude, latitude          [rad]  scalars, geodetic (WGS 84), east and north positive
 * Returned  [rad], -pi/2 to pi/2; NaN outside the domain
 * Accuracy  0.01 deg from 1972 to 2050: aberration, polar motion and UT1 - UTC are left out; test/kernel/night.test.ts
 * Source    spherical trigonometry; Hilton et al. 2006, Celest. Mech. 94, 351 (precession)
 */
export function altitude(
  time: number,
  rightAscension: number,
  declination: number,
  longitude: number,
  latitude: number,
): number {
  if (!(isNight(time) && isPlace(rightAscension, declination) && isPoint(longitude, latitude))) return Number.NaN;
  orientationAt(time, orientation);
  starOfDate(rightAscension, declination, orientation, star);
  return altitudeOf(star, orientation.sidereal + longitude, latitude);
}

/** `altitude` of the first `rows` entries, to the same bits. */
export function altitudes(
  rows: number,
  out: Float64Array,
  time: Float64Array,
  rightAscension: Float64Array,
  declination: Float64Array,
  longitude: Float64Array,
  latitude: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = altitude(time[row]!, rightAscension[row]!, declination[row]!, longitude[row]!, latitude[row]!);
  }
}
