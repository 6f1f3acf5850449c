import { isAirRange } from "./airFormula.js";
import { refractivity } from "./refractivity.js";

/**
 * Wavelength in standard air from that in vacuum.
 *
 *     air = vacuum / n(vacuum),  n - 1 from `refractivity`
 *
 * Given
 *   vacuumWavelength  [m]  scalar, 200 to 2500 nm
 *   formula                scalar, 0 Ciddor 1996, 1 Morton 2000
 * Returned  [m]; NaN outside the domain
 * Accuracy  relative error <= 4e-15 of the formula; test/kernel/reference.test.ts
 * Source    Ciddor 1996 Appl. Opt. 35, 1566; Morton 2000 ApJS 130, 403
 */
export function airWavelength(vacuumWavelength: number, formula: number): number {
  return isAirRange(vacuumWavelength) ? vacuumWavelength / (1 + refractivity(vacuumWavelength, formula)) : Number.NaN;
}

/** `airWavelength` of the first `rows` entries, to the same bits. */
export function airWavelengths(
  rows: number,
  out: Float64Array,
  vacuumWavelength: Float64Array,
  formula: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = airWavelength(vacuumWavelength[row], formula[row]);
}
