import { isMagnitude } from "./domain.js";
import { shiftOfSpeed } from "./shiftOfSpeed.js";

/**
 * Shift in wavelength of one spectral line.
 *
 *     observed - rest = rest z,  z from `shiftOfSpeed`
 *
 * Given
 *   wavelength  [m]    scalar, > 0: at rest
 *   speed       [m/s]  scalar, -c < v < c, receding positive; linear: |v| <= 0.1 c
 *   model              scalar, 0 relativistic, 1 linear
 * Returned  [m] positive to the red; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/reference.test.ts
 * Source    definition of the shift z = (observed - rest) / rest
 */
export function lineShift(wavelength: number, speed: number, model: number): number {
  return isMagnitude(wavelength) ? wavelength * shiftOfSpeed(speed, model) : Number.NaN;
}

/** `lineShift` of the first `rows` entries, to the same bits. */
export function lineShifts(
  rows: number,
  out: Float64Array,
  wavelength: Float64Array,
  speed: Float64Array,
  model: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = lineShift(wavelength[row], speed[row], model[row]);
}
