import { speedOfLight } from "./constants.js";
import { isMagnitudeOrZero } from "./domain.js";
import { greatestLinearShift, linear, relativistic } from "./dopplerModel.js";

/**
 * Speed along the line of sight from a fractional wavelength shift: the inverse of `shiftOfSpeed`.
 *
 *     relativistic:  v / c = ((1 + z)^2 - 1) / ((1 + z)^2 + 1),  computed as  z (2 + z) / (1 + (1 + z)^2)
 *     linear:        v / c = z
 *
 * Given
 *   shift  [1]  scalar, z > -1; linear: |z| <= 0.1
 *   model       scalar, 0 relativistic, 1 linear
 * Returned  [m/s] receding positive, slower than light; NaN outside the domain (see domain.ts) and where the speed
 *           would round to that of light (z from about 1e8 up)
 * Accuracy  relative error <= 4e-15; test/kernel/reference.test.ts
 * Source    Einstein 1905; Wright & Eastman 2014 PASP 126, 838 for radial velocities
 */
export function speedOfShift(shift: number, model: number): number {
  if (!(shift > -1 && isMagnitudeOrZero(Math.abs(shift)))) return Number.NaN;
  if (model === relativistic) {
    const stretch = 1 + shift;
    const speed = (speedOfLight * shift * (2 + shift)) / (1 + stretch * stretch);
    return Math.abs(speed) < speedOfLight ? speed : Number.NaN;
  }
  return model === linear && Math.abs(shift) <= greatestLinearShift ? speedOfLight * shift : Number.NaN;
}

/** `speedOfShift` of the first `rows` entries, to the same bits. */
export function speedsOfShifts(rows: number, out: Float64Array, shift: Float64Array, model: Float64Array): void {
  for (let row = 0; row < rows; row++) out[row] = speedOfShift(shift[row], model[row]);
}
