import { cos, sin } from "../angle.js";

const turn = 2 * Math.PI;
const degree = Math.PI / 180;
const arcsec = Math.PI / 648000;
const julianCentury = 36525;

/** Distances of the Moon are in radii of the Earth. */
export const earthRadius = 6378137;

/**
 * Position of the Moon from the geocentre, on the axes of date, in radii of the Earth.
 *
 *     ecliptic longitude L0 + dL, latitude 18520" sin S + N, parallax: the greatest terms of the lunar theory
 *
 * Given
 *   time  [d from J2000.0 TT]  scalar, 1950 to 2050 for the accuracy; UTC serves to 0.01 deg
 *   out                        three numbers to fill
 * Returned  nothing
 * Accuracy  0.08 deg in direction, 1 % in distance, from 1972 to 2050; test/kernel/night.test.ts
 * Source    Brown's lunar theory as cut down by Montenbruck & Pfleger 2000, Astronomy on the Personal Computer, sect. 3.2,
 *           and, for the parallax, The Astronomical Almanac, section D (both from memory; the test decides)
 */
export function moonPosition(time: number, out: Float64Array): void {
  const T = time / julianCentury;
  const mean = turn * (0.606433 + 1336.855225 * T);
  const l = turn * (0.374897 + 1325.55241 * T);
  const sun = turn * (0.993133 + 99.997361 * T);
  const D = turn * (0.827361 + 1236.853086 * T);
  const F = turn * (0.259086 + 1342.227825 * T);
  const dL =
    22640 * sin(l) -
    4586 * sin(l - 2 * D) +
    2370 * sin(2 * D) +
    769 * sin(2 * l) -
    668 * sin(sun) -
    412 * sin(2 * F) -
    212 * sin(2 * l - 2 * D) -
    206 * sin(l + sun - 2 * D) +
    192 * sin(l + 2 * D) -
    165 * sin(sun - 2 * D) -
    125 * sin(D) -
    110 * sin(l + sun) +
    148 * sin(l - sun) -
    55 * sin(2 * F - 2 * D);
  const S = F + arcsec * (dL + 412 * sin(2 * F) + 541 * sin(sun));
  const h = F - 2 * D;
  const N =
    -526 * sin(h) +
    44 * sin(l + h) -
    31 * sin(h - l) -
    23 * sin(sun + h) +
    11 * sin(h - sun) -
    25 * sin(F - 2 * l) +
    21 * sin(F - l);
  const longitude = mean + arcsec * dL;
  const latitude = arcsec * (18520 * sin(S) + N);
  const parallax =
    degree * (0.9508 + 0.0518 * cos(l) + 0.0095 * cos(2 * D - l) + 0.0078 * cos(2 * D) + 0.0028 * cos(2 * l));
  const distance = 1 / sin(parallax);
  const obliquity = degree * (23.439 - 4e-7 * time);
  const x = cos(latitude) * cos(longitude);
  const y = cos(latitude) * sin(longitude);
  const z = sin(latitude);
  out[0] = distance * x;
  out[1] = distance * (y * cos(obliquity) - z * sin(obliquity));
  out[2] = distance * (y * sin(obliquity) + z * cos(obliquity));
}
