import { speedOfLight } from "./constants.js";
import { isMagnitude, isMagnitudeOrZero } from "./domain.js";

/**
 * Speed from the shift of a spectral line on the detector: the inverse of `pixelShift`.
 *
 *     v = shift c / (R s),  R = wavelength / resolution element,  s pixels in a resolution element
 *
 * Given
 *   pixels            [pixel]  scalar, either sign: the shift, positive to the red
 *   resolvingPower    [1]      scalar, > 0
 *   pixelsPerElement  [pixel]  scalar, > 0
 * Returned  [m/s] receding positive; NaN outside the domain (see domain.ts) and where it would reach that of light
 * Accuracy  relative error <= 4e-15; test/kernel/reference.test.ts
 * Source    definition of resolving power (common practice, no source)
 */
export function pixelSpeed(pixels: number, resolvingPower: number, pixelsPerElement: number): number {
  if (!(isMagnitudeOrZero(Math.abs(pixels)) && isMagnitude(resolvingPower) && isMagnitude(pixelsPerElement))) {
    return Number.NaN;
  }
  const speed = (pixels / (resolvingPower * pixelsPerElement)) * speedOfLight;
  return Math.abs(speed) < speedOfLight ? speed : Number.NaN;
}

/** `pixelSpeed` of the first `rows` entries, to the same bits. */
export function pixelSpeeds(
  rows: number,
  out: Float64Array,
  pixels: Float64Array,
  resolvingPower: Float64Array,
  pixelsPerElement: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = pixelSpeed(pixels[row], resolvingPower[row], pixelsPerElement[row]);
}
