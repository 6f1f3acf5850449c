import { cos } from "../angle.js";
import { astronomicalUnit } from "../constants.js";
import { isNight } from "./altitude.js";
import { earthRadius, moonPosition } from "./moon.js";
import { angleBetween } from "./moonDistance.js";
import { sunDirection, sunDistance } from "./sun.js";

const sun = new Float64Array(3);
const moon = new Float64Array(3);
const earth = new Float64Array(3);

/**
 * Part of the Moon's disk that the Sun lights.
 *
 *     k = (1 + cos i) / 2,  i the angle between Sun and Earth as the Moon sees them
 *
 * Given
 *   time  [d from J2000.0 UTC]  scalar, 1900 to 2100
 * Returned  [1], 0 at new moon to 1 at full moon; NaN outside the domain
 * Accuracy  0.003 from 1972 to 2050; test/kernel/night.test.ts
 * Source    geometry; see moon.ts and sun.ts
 */
export function moonLit(time: number): number {
  if (!isNight(time)) return Number.NaN;
  sunDirection(time, sun);
  moonPosition(time, moon);
  const far = (sunDistance(time) * astronomicalUnit) / earthRadius;
  for (let axis = 0; axis < 3; axis++) {
    sun[axis] = far * sun[axis]! - moon[axis]!;
    earth[axis] = -moon[axis]!;
  }
  return (1 + cos(angleBetween(sun, earth))) / 2;
}

/** `moonLit` of the first `rows` entries, to the same bits. */
export function moonLits(rows: number, out: Float64Array, time: Float64Array): void {
  for (let row = 0; row < rows; row++) out[row] = moonLit(time[row]!);
}
