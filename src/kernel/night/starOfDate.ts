import { cos, sin } from "../angle.js";
import { earthOrientation, newOrientation, type Orientation } from "../sky/earthOrientation.js";

/** Terrestrial time less UTC [d], to a minute from 1960 to 2060: enough for precession and nutation. */
const ttMinusUtc = 69.184 / 86400;

/**
 * Axes of date and sidereal time without a table of leap seconds, so that a night far ahead can be planned.
 *
 * Given
 *   utc  [d from J2000.0 UTC]  scalar; UT1 is taken to be UTC, which is worth 0.004 deg
 *   out                        to fill
 */
export function orientationAt(utc: number, out: Orientation): void {
  earthOrientation(utc, utc + ttMinusUtc, out);
}

/**
 * Direction of a star on the axes of date; aberration, 0.006 deg, is left out.
 *
 * Given
 *   rightAscension, declination  [rad]  scalars, ICRS
 *   orientation                         that of the date
 *   out                                 three numbers to fill: the unit vector
 */
export function starOfDate(
  rightAscension: number,
  declination: number,
  { axes }: Orientation,
  out: Float64Array,
): void {
  const x = cos(declination) * cos(rightAscension);
  const y = cos(declination) * sin(rightAscension);
  const z = sin(declination);
  for (let row = 0; row < 3; row++) out[row] = axes[3 * row]! * x + axes[3 * row + 1]! * y + axes[3 * row + 2]! * z;
}

/** An orientation to work with. */
export { newOrientation };
