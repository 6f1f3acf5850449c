import { speedOfLight } from "./constants.js";
import { isVelocity } from "./domain.js";
import { greatestLinearShift, linear, relativistic } from "./dopplerModel.js";

/**
 * Fractional wavelength shift of a source that moves along the line of sight.
 *
 *     relativistic:  1 + z = ((c + v) / (c - v))^(1/2),  computed as  z = 2 v / (c - v + ((c - v)(c + v))^(1/2))
 *     linear:        z = v / c
 *
 * The computed form has no difference of nearly equal terms at any speed: c - v of two doubles is rounded once.
 *
 * Given
 *   speed  [m/s]  scalar, -c < v < c, receding positive; linear: |v| <= 0.1 c
 *   model         scalar, 0 relativistic, 1 linear
 * Returned  [1]; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/reference.test.ts
 * Source    Einstein 1905; Wright & Eastman 2014 PASP 126, 838 for radial velocities
 */
export function shiftOfSpeed(speed: number, model: number): number {
  if (!isVelocity(speed)) return Number.NaN;
  if (model === relativistic) {
    const approach = speedOfLight - speed;
    return (2 * speed) / (approach + Math.sqrt(approach * (speedOfLight + speed)));
  }
  const shift = speed / speedOfLight;
  return model === linear && Math.abs(shift) <= greatestLinearShift ? shift : Number.NaN;
}

/** `shiftOfSpeed` of the first `rows` entries, to the same bits. */
export function shiftsOfSpeeds(rows: number, out: Float64Array, speed: Float64Array, model: Float64Array): void {
  for (let row = 0; row < rows; row++) out[row] = shiftOfSpeed(speed[row], model[row]);
}
