import { cos, sin } from "../angle.js";
import { type Orientation, rotationRate } from "./earthOrientation.js";

/** WGS 84: equatorial radius [m] and flattening. */
const equatorialRadius = 6378137;
const flattening = 1 / 298.257223563;
const squash = (1 - flattening) * (1 - flattening);

/**
 * Position and velocity of a site about the geocentre, on the axes of the ICRS.
 *
 * Given
 *   longitude, latitude  [rad]  scalars, geodetic, east and north positive
 *   height               [m]    scalar, above the ellipsoid
 *   orientation                 of the Earth at the instant
 *   out                         six numbers to fill
 * Returned  out = x, y, z [m], then their rates [m/s]
 * Accuracy  1 mm/s and 10 m; test/kernel/barycentric.test.ts
 * Source    NGA.STND.0036 (WGS 84)
 */
export function siteState(
  longitude: number,
  latitude: number,
  height: number,
  orientation: Orientation,
  out: Float64Array,
): void {
  const c = cos(latitude);
  const s = sin(latitude);
  const normal = equatorialRadius / Math.sqrt(c * c + squash * s * s);
  const away = (normal + height) * c;
  const up = (squash * normal + height) * s;
  const hour = orientation.sidereal + longitude;
  const x = away * cos(hour);
  const y = away * sin(hour);
  const { axes } = orientation;
  for (let axis = 0; axis < 3; axis++) {
    out[axis] = x * axes[axis]! + y * axes[3 + axis]! + up * axes[6 + axis]!;
    out[axis + 3] = rotationRate * (x * axes[3 + axis]! - y * axes[axis]!);
  }
}
