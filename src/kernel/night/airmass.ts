import { sin } from "../angle.js";
import { altitude } from "./altitude.js";

/**
 * Air that light crosses, relative to the zenith, from the true altitude.
 *
 *     X = (1.002432 c^2 + 0.148386 c + 0.0096467) / (c^3 + 0.149864 c^2 + 0.0102963 c + 0.000303978),  c = cos z
 *
 * Chosen because it takes the altitude without refraction, which is what the stars' places give.
 *
 * Given
 *   altitude  [rad]  scalar, 0 to pi/2, without refraction
 * Returned  [1], 1 (and 4e-7) at the zenith to 31.7 at the horizon; NaN below it
 * Accuracy  of the formula itself 0.4 % at the horizon; test/kernel/night.test.ts
 * Source    Young 1994, Appl. Opt. 33, 1108 (coefficients from memory)
 */
export function airmassAt(altitude: number): number {
  if (!(altitude >= 0 && altitude <= Math.PI / 2)) return Number.NaN;
  const c = sin(altitude);
  const above = (1.002432 * c + 0.148386) * c + 0.0096467;
  return above / (((c + 0.149864) * c + 0.0102963) * c + 0.000303978);
}

/**
 * Altitude at which the air is so much, the inverse of `airmassAt` by bisection.
 *
 * Given
 *   airmass  [1]  scalar, from 1
 * Returned  [rad], 0 for any airmass beyond that of the horizon
 */
export function altitudeOfAirmass(airmass: number): number {
  let low = 0;
  let high = Math.PI / 2;
  if (airmassAt(low) <= airmass) return low;
  for (let step = 0; step < 60; step++) {
    const middle = (low + high) / 2;
    if (airmassAt(middle) > airmass) low = middle;
    else high = middle;
  }
  return high;
}

/**
 * Airmass of a star; arguments and domain as for `altitude`.
 *
 * Returned  [1]; NaN outside the domain and below the horizon
 * Accuracy  0.5 % above 15 deg, as far as other formulas differ; test/kernel/night.test.ts
 */
export function airmass(
  time: number,
  rightAscension: number,
  declination: number,
  longitude: number,
  latitude: number,
): number {
  return airmassAt(altitude(time, rightAscension, declination, longitude, latitude));
}

/** `airmass` of the first `rows` entries, to the same bits. */
export function airmasses(
  rows: number,
  out: Float64Array,
  time: Float64Array,
  rightAscension: Float64Array,
  declination: Float64Array,
  longitude: Float64Array,
  latitude: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = airmass(time[row]!, rightAscension[row]!, declination[row]!, longitude[row]!, latitude[row]!);
  }
}
