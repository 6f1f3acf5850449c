/*
 * Which published dispersion formula of standard air (15 C, 101325 Pa, dry), as the number code the kernels take,
 * and where both are used. A limit typed in another unit can round past itself, so limits hold to one part in 1e12.
 */
export const ciddor1996 = 0;
export const morton2000 = 1;

const rounding = 1e-12;
const shortest = 200e-9 * (1 - rounding);
const longest = 2500e-9 * (1 + rounding);

/** [m] Within the range where wavelengths in air are in use: 200 to 2500 nm. */
export function isAirRange(wavelength: number): boolean {
  return wavelength >= shortest && wavelength <= longest;
}
