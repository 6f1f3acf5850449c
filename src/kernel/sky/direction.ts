import { cos, sin } from "../angle.js";
import { astronomicalUnit, julianYear } from "../constants.js";

const epochOfJ2000 = 2000;
const daysPerYear = 365.25;

/**
 * Unit vector from an observer to a star that moves on a straight line at a steady speed, its radial motion neglected.
 *
 *     n ~ p + (t - t0)(mu_alpha* east + mu_delta north) - parallax r / au
 *
 * Given
 *   rightAscension, declination  [rad]      scalars, ICRS at the epoch
 *   motionEast, motionNorth      [rad/s]    scalars: proper motion in right ascension times cos dec, in declination
 *   parallax                     [rad]      scalar, >= 0: 0 for a star without one
 *   epoch                        [s]        scalar: Julian years since year 0
 *   tdb                          [d from J2000.0 TDB]
 *   place                        [m]        position of the observer about the barycentre
 *   out                          three numbers to fill
 * Returned  the component [1] of the star's own transverse motion along n times its parallax, [rad/s]: 0 at the epoch
 * Source    ESA 1997, The Hipparcos Catalogue, vol. 1, sect. 1.5.5
 */
export function direction(
  rightAscension: number,
  declination: number,
  motionEast: number,
  motionNorth: number,
  parallax: number,
  epoch: number,
  tdb: number,
  place: Float64Array,
  out: Float64Array,
): number {
  const [ca, sa] = [cos(rightAscension), sin(rightAscension)];
  const [cd, sd] = [cos(declination), sin(declination)];
  const since = (tdb / daysPerYear + epochOfJ2000) * julianYear - epoch;
  const moveX = -sa * motionEast - ca * sd * motionNorth;
  const moveY = ca * motionEast - sa * sd * motionNorth;
  const moveZ = cd * motionNorth;
  const near = parallax / astronomicalUnit;
  const x = ca * cd + since * moveX - near * place[0]!;
  const y = sa * cd + since * moveY - near * place[1]!;
  const z = sd + since * moveZ - near * place[2]!;
  const length = Math.sqrt(x * x + y * y + z * z);
  out[0] = x / length;
  out[1] = y / length;
  out[2] = z / length;
  return moveX * out[0] + moveY * out[1] + moveZ * out[2];
}
