import { speedOfLight } from "./constants.js";
import { isMagnitude, isVelocity } from "./domain.js";

/**
 * Shift of a spectral line on the detector, in pixels, where a pixel is a fixed step in speed.
 *
 *     shift = v R s / c,  R = wavelength / resolution element,  s pixels in a resolution element
 *
 * Given
 *   speed             [m/s]    scalar, -c < v < c, receding positive
 *   resolvingPower    [1]      scalar, > 0
 *   pixelsPerElement  [pixel]  scalar, > 0
 * Returned  [pixel] positive to the red; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/reference.test.ts
 * Source    definition of resolving power (common practice, no source)
 */
export function pixelShift(speed: number, resolvingPower: number, pixelsPerElement: number): number {
  if (!(isVelocity(speed) && isMagnitude(resolvingPower) && isMagnitude(pixelsPerElement))) return Number.NaN;
  return (speed / speedOfLight) * resolvingPower * pixelsPerElement;
}

/** `pixelShift` of the first `rows` entries, to the same bits. */
export function pixelShifts(
  rows: number,
  out: Float64Array,
  speed: Float64Array,
  resolvingPower: Float64Array,
  pixelsPerElement: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = pixelShift(speed[row], resolvingPower[row], pixelsPerElement[row]);
}
