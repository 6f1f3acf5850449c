import { isNight, isPlace, isPoint } from "./altitude.js";
import { darkness, noonBefore } from "./darkness.js";
import { newOrientation, orientationAt, starOfDate } from "./starOfDate.js";
import { upSpans } from "./upSpans.js";

const orientation = newOrientation();
const star = new Float64Array(3);

/**
 * How long a star stands above an altitude while it is dark, in the night that begins on a date at the site.
 *
 * Given
 *   night                        [d from J2000.0]  scalar, 1900 to 2100: any time of that date
 *   rightAscension, declination  [rad]  scalars, ICRS, at the time
 *   longitude, latitude          [rad]  scalars, geodetic (WGS 84), east and north positive
 *   lowest                       [rad]  scalar, 0 <= lowest < pi/2: the altitude, without refraction
 *   sunBelow                     [rad]  scalar, -pi/2 < sunBelow <= 0: the Sun's altitude under which it is dark
 * Returned  [s], 0 where it stands above only by day or never; NaN outside the domain and in a night that is never dark
 * Accuracy  10 s at middle latitudes; test/kernel/night.test.ts
 * Source    see darkness.ts and upSpans.ts
 */
export function hoursUp(
  night: number,
  rightAscension: number,
  declination: number,
  longitude: number,
  latitude: number,
  lowest: number,
  sunBelow: number,
): number {
  if (!(isNight(night) && isPlace(rightAscension, declination) && isPoint(longitude, latitude))) return Number.NaN;
  if (!(lowest >= 0 && lowest < Math.PI / 2 && sunBelow <= 0 && sunBelow > -Math.PI / 2)) return Number.NaN;
  const noon = noonBefore(night, longitude);
  const dark = darkness(noon, longitude, latitude, sunBelow);
  if (dark.length === 0) return Number.NaN;
  orientationAt(noon + 0.5, orientation);
  starOfDate(rightAscension, declination, orientation, star);
  const sidereal = orientation.sidereal + longitude;
  const spans = dark.flatMap((span) => upSpans(star, sidereal, noon + 0.5, latitude, lowest, span));
  return 86400 * spans.reduce((sum, { from, to }) => sum + (to - from), 0);
}

/** `hoursUp` of the first `rows` entries, to the same bits. */
export function hoursUps(rows: number, out: Float64Array, ...columns: Float64Array[]): void {
  const [night, rightAscension, declination, longitude, latitude, lowest, sunBelow] = columns;
  for (let row = 0; row < rows; row++) {
    out[row] = hoursUp(
      night![row]!,
      rightAscension![row]!,
      declination![row]!,
      longitude![row]!,
      latitude![row]!,
      lowest![row]!,
      sunBelow![row]!,
    );
  }
}
