import { cos } from "../angle.js";
import { astronomicalUnit, solarMassParameter, speedOfLight, terrestrialMassParameter } from "../constants.js";
import { direction } from "./direction.js";
import { newObserver, observe } from "./observer.js";

const observer = newObserver();
const towards = new Float64Array(3);

/**
 * Barycentric correction of a radial velocity, as the barycentric radial-velocity measure c z_B.
 *
 *     1 + z_B = gamma (1 + v.n / c) / (1 + Phi / c^2) * 1 / (1 + v_star.n / c)
 *
 * to be applied as 1 + z = (1 + z_measured)(1 + z_B). Phi is the potential of Sun and Earth at the site. The last factor
 * is the star's own motion across the sky, which turns into the line of sight with the years (secular acceleration); it
 * counts where both proper motion and parallax are given and is 1 at the epoch.
 *
 * Given
 *   time                         [d from J2000.0 UTC]  scalar, from 1972 up to 2036
 *   rightAscension, declination  [rad]    scalars, ICRS at the epoch
 *   longitude, latitude          [rad]    scalars, geodetic (WGS 84), east and north positive
 *   height                       [m]      scalar, above the ellipsoid
 *   motionEast, motionNorth      [rad/s]  scalars: proper motion in right ascension times cos dec, in declination
 *   parallax                     [rad]    scalar, >= 0
 *   epoch                        [s]      scalar: Julian years since year 0
 * Returned  [m/s]; NaN outside the domain
 * Accuracy  2 mm/s against the ephemeris it is fitted to; UT1 = UTC is worth up to 0.03 m/s, polar motion 1 mm/s;
 *           test/kernel/barycentric.test.ts, test/astropy/barycentric.test.ts
 * Source    Wright & Eastman 2014, PASP 126, 838, eq. 28; Lindegren & Dravins 2003, A&A 401, 1185
 */
export function barycentricSpeed(
  time: number,
  rightAscension: number,
  declination: number,
  longitude: number,
  latitude: number,
  height: number,
  motionEast = 0,
  motionNorth = 0,
  parallax = 0,
  epoch = 0,
): number {
  if (!(isSite(longitude, latitude, height) && parallax >= 0)) return Number.NaN;
  observe(time, longitude, latitude, height, observer);
  const { state, site, tt, tdb } = observer;
  const turning = direction(rightAscension, declination, motionEast, motionNorth, parallax, epoch, tdb, state, towards);
  const radial = dot(state, 3, towards) / speedOfLight;
  const beta2 = (state[3]! ** 2 + state[4]! ** 2 + state[5]! ** 2) / speedOfLight ** 2;
  const root = Math.sqrt(1 - beta2);
  const gamma1 = beta2 / (root * (1 + root));
  const height0 = Math.sqrt(site[0]! ** 2 + site[1]! ** 2 + site[2]! ** 2);
  const potential =
    (solarMassParameter / distanceOfSun(tt) + terrestrialMassParameter / height0) / (speedOfLight * speedOfLight);
  const star = parallax > 0 ? (turning * astronomicalUnit) / parallax / speedOfLight : 0;
  // (1 + gamma1)(1 + radial) / ((1 - potential)(1 + star)) - 1 without the loss of the small in the 1.
  const above = gamma1 + radial + gamma1 * radial;
  const below = star - potential - potential * star;
  return (speedOfLight * (above - below)) / (1 + below);
}

function dot(a: Float64Array, from: number, b: Float64Array): number {
  return a[from]! * b[0]! + a[from + 1]! * b[1]! + a[from + 2]! * b[2]!;
}

/** [m] The Astronomical Almanac's short formula, good to 1e-4: 0.3 mm/s in the redshift of the Sun's potential. */
function distanceOfSun(tt: number): number {
  const g = ((357.529 + 0.98560028 * tt) * Math.PI) / 180;
  return astronomicalUnit * (1.00014 - 0.01671 * cos(g) - 0.00014 * cos(2 * g));
}

/** The ground and what flies near it. */
export function isSite(longitude: number, latitude: number, height: number): boolean {
  return (
    Math.abs(longitude) <= 2 * Math.PI * (1 + 1e-12) &&
    Math.abs(latitude) <= (Math.PI / 2) * (1 + 1e-12) &&
    Math.abs(height) <= 1e5
  );
}

/** `barycentricSpeed` of the first `rows` entries, to the same bits. */
export function barycentricSpeeds(
  rows: number,
  out: Float64Array,
  time: Float64Array,
  rightAscension: Float64Array,
  declination: Float64Array,
  longitude: Float64Array,
  latitude: Float64Array,
  height: Float64Array,
  motionEast: Float64Array,
  motionNorth: Float64Array,
  parallax: Float64Array,
  epoch: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = barycentricSpeed(
      time[row]!,
      rightAscension[row]!,
      declination[row]!,
      longitude[row]!,
      latitude[row]!,
      height[row]!,
      motionEast[row]!,
      motionNorth[row]!,
      parallax[row]!,
      epoch[row]!,
    );
  }
}
