import { ciddor1996, morton2000 } from "./airFormula.js";

/**
 * Refractivity of standard air (15 C, 101325 Pa, dry).
 *
 *     s = 1 um / wavelength
 *     Ciddor 1996:   n - 1 = 0.05792105 / (238.0185 - s^2) + 0.00167917 / (57.362 - s^2)
 *     Morton 2000:   n - 1 = 8.34254e-5 + 0.02406147 / (130 - s^2) + 1.5998e-4 / (38.9 - s^2)
 *
 * Given
 *   vacuumWavelength  [m]  scalar, 199.9 to 2501 nm: 200 to 2500 nm, wherever that limit is on the air wavelength
 *   formula                scalar, 0 Ciddor 1996, 1 Morton 2000
 * Returned  [1] n - 1; NaN outside the domain
 * Accuracy  relative error <= 4e-15 of the formula; test/kernel/reference.test.ts. The two formulae differ in n by less
 *           than 6e-9 (1.7 m/s) above 230 nm and by 3e-7 (89 m/s) at 200 nm, where both are extrapolated
 * Source    Ciddor 1996 Appl. Opt. 35, 1566, fitted from 230 to 1690 nm, 450 ppm CO2; Morton 2000 ApJS 130, 403 after
 *           Birch & Downs 1994 Metrologia 31, 315
 */
export function refractivity(vacuumWavelength: number, formula: number): number {
  if (!(vacuumWavelength >= 199.9e-9 && vacuumWavelength <= 2501e-9)) return Number.NaN;
  const wavenumber = 1e-6 / vacuumWavelength;
  const square = wavenumber * wavenumber;
  if (formula === ciddor1996) return 0.05792105 / (238.0185 - square) + 0.00167917 / (57.362 - square);
  if (formula === morton2000) return 8.34254e-5 + 0.02406147 / (130 - square) + 1.5998e-4 / (38.9 - square);
  return Number.NaN;
}
