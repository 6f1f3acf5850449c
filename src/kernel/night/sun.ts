import { cos, sin } from "../angle.js";

const degree = Math.PI / 180;

/**
 * Direction of the Sun from the geocentre, on the axes of date.
 *
 *     g = 357.528 + 0.9856003 n,  L = 280.460 + 0.9856474 n,  lambda = L + 1.915 sin g + 0.020 sin 2g  [deg]
 *
 * Given
 *   time  [d from J2000.0]  scalar, 1950 to 2050 for the accuracy; UTC, TT and TDB serve alike
 *   out                     three numbers to fill: the unit vector
 * Returned  nothing
 * Accuracy  0.015 deg from 1972 to 2050; test/kernel/night.test.ts
 * Source    The Astronomical Almanac, section C, low-precision formulas for the Sun (from memory; the test decides)
 */
export function sunDirection(time: number, out: Float64Array): void {
  const g = degree * (357.528 + 0.9856003 * time);
  const lambda = degree * (280.46 + 0.9856474 * time + 1.915 * sin(g) + 0.02 * sin(2 * g));
  const obliquity = degree * (23.439 - 4e-7 * time);
  const y = sin(lambda);
  out[0] = cos(lambda);
  out[1] = y * cos(obliquity);
  out[2] = y * sin(obliquity);
}

/** Distance of the Sun from the geocentre [AU], to 1e-4, by the same formulas. */
export function sunDistance(time: number): number {
  const g = degree * (357.528 + 0.9856003 * time);
  return 1.00014 - 0.01671 * cos(g) - 0.00014 * cos(2 * g);
}
