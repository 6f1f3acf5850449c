import { isAirRange } from "./airFormula.js";
import { refractivity } from "./refractivity.js";

/** A step leaves less than 3e-4 of the error before it (the slope of n), so four from 3e-4 end far below a double. */
const steps = 4;

/**
 * Wavelength in vacuum from that in standard air: the inverse of `airWavelength`, whose formulae want the vacuum one.
 *
 *     vacuum = air n(vacuum), by iteration;  n - 1 from `refractivity`
 *
 * Given
 *   airWavelength  [m]  scalar, 200 to 2500 nm
 *   formula             scalar, 0 Ciddor 1996, 1 Morton 2000
 * Returned  [m]; NaN outside the domain
 * Accuracy  relative error <= 4e-15 of the formula; test/kernel/reference.test.ts
 * Source    Ciddor 1996 Appl. Opt. 35, 1566; Morton 2000 ApJS 130, 403
 */
export function vacuumWavelength(airWavelength: number, formula: number): number {
  if (!isAirRange(airWavelength)) return Number.NaN;
  let vacuum = airWavelength;
  for (let step = 0; step < steps; step++) vacuum = airWavelength * (1 + refractivity(vacuum, formula));
  return vacuum;
}

/** `vacuumWavelength` of the first `rows` entries, to the same bits. */
export function vacuumWavelengths(
  rows: number,
  out: Float64Array,
  airWavelength: Float64Array,
  formula: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = vacuumWavelength(airWavelength[row], formula[row]);
}
