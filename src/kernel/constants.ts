/**
 * A constant of the standards.
 *
 * `name` is what an analyst types, `value` is in `unit` (IVOA VOUnits 1.1 spelling, SI units only), and `definedBy`
 * is the resolution or adjustment that fixes the value.
 */
export interface Constant {
  readonly name: string;
  readonly meaning: string;
  readonly value: number;
  readonly unit: string;
  readonly definedBy: string;
}

// Exact by definition of the SI (2019).
export const speedOfLight = 299792458;
export const planckConstant = 6.62607015e-34;
export const boltzmannConstant = 1.380649e-23;
export const elementaryCharge = 1.602176634e-19;
export const avogadroConstant = 6.02214076e23;

/** 2 pi^5 k^4 / (15 h^3 c^2), exact as its factors are; written out to the nearest double. */
export const stefanBoltzmannConstant = 5.6703744191844294e-8;

// Measured; relative uncertainties 2.2e-5 and 3.1e-10. Only a result in kilograms depends on them.
export const gravitationalConstant = 6.6743e-11;
export const atomicMassConstant = 1.66053906892e-27;

export const day = 86400;
export const julianYear = 365.25 * day;

export const astronomicalUnit = 149597870700;
export const parsec = (648000 / Math.PI) * astronomicalUnit;
export const lightYear = speedOfLight * julianYear;

// Nominal values, exact by resolution. Masses are mass parameters GM, so that G enters no result.
export const solarMassParameter = 1.3271244e20;
export const jovianMassParameter = 1.2668653e17;
export const terrestrialMassParameter = 3.986004e14;
export const solarRadius = 6.957e8;
export const jovianEquatorialRadius = 7.1492e7;
export const jovianPolarRadius = 6.6854e7;
export const terrestrialEquatorialRadius = 6.3781e6;
export const terrestrialPolarRadius = 6.3568e6;
export const solarLuminosity = 3.828e26;
export const solarIrradiance = 1361;
export const solarEffectiveTemperature = 5772;

/** Luminosity of absolute bolometric magnitude 0, and the irradiance from it at 10 pc. */
export const zeroMagnitudeLuminosity = 3.0128e28;
export const zeroMagnitudeIrradiance = zeroMagnitudeLuminosity / (4 * Math.PI * 100 * parsec * parsec);

const si = "SI (2019), exact";
const codata = "CODATA 2022";
const nominal = "IAU 2015 Resolution B3, nominal, exact";
const perG = "IAU 2015 Resolution B3 mass parameter divided by G of CODATA 2022";
const bolometric = "IAU 2015 Resolution B2, exact";

/** Every constant, by name. */
export const constants: readonly Constant[] = [
  ["c", "speed of light in vacuum", speedOfLight, "m/s", si],
  ["h", "Planck constant", planckConstant, "J.s", si],
  ["k", "Boltzmann constant", boltzmannConstant, "J/K", si],
  ["e", "elementary charge", elementaryCharge, "C", si],
  ["N_A", "Avogadro constant", avogadroConstant, "mol**-1", si],
  ["sigma_SB", "Stefan-Boltzmann constant", stefanBoltzmannConstant, "W/(m**2.K**4)", si],
  ["G", "Newtonian constant of gravitation", gravitationalConstant, "m**3/(kg.s**2)", codata],
  ["u", "atomic mass constant", atomicMassConstant, "kg", codata],
  ["day", "day", day, "s", "86400 s, exact; accepted with the SI"],
  ["year", "Julian year", julianYear, "s", "365.25 d, exact; IAU Style Manual (1989)"],
  ["au", "astronomical unit", astronomicalUnit, "m", "IAU 2012 Resolution B2, exact"],
  ["pc", "parsec", parsec, "m", "IAU 2015 Resolution B2, 648000/pi au, exact"],
  ["lyr", "light year", lightYear, "m", "c times a Julian year, exact"],
  ["GM_sun", "solar mass parameter", solarMassParameter, "m**3/s**2", nominal],
  ["GM_jupiter", "jovian mass parameter", jovianMassParameter, "m**3/s**2", nominal],
  ["GM_earth", "terrestrial mass parameter", terrestrialMassParameter, "m**3/s**2", nominal],
  ["M_sun", "mass of the Sun", solarMassParameter / gravitationalConstant, "kg", perG],
  ["M_jupiter", "mass of Jupiter", jovianMassParameter / gravitationalConstant, "kg", perG],
  ["M_earth", "mass of the Earth", terrestrialMassParameter / gravitationalConstant, "kg", perG],
  ["R_sun", "solar radius", solarRadius, "m", nominal],
  ["R_jupiter", "equatorial radius of Jupiter", jovianEquatorialRadius, "m", nominal],
  ["R_jupiter_polar", "polar radius of Jupiter", jovianPolarRadius, "m", nominal],
  ["R_earth", "equatorial radius of the Earth", terrestrialEquatorialRadius, "m", nominal],
  ["R_earth_polar", "polar radius of the Earth", terrestrialPolarRadius, "m", nominal],
  ["L_sun", "solar luminosity", solarLuminosity, "W", nominal],
  ["S_sun", "total solar irradiance at 1 au", solarIrradiance, "W/m**2", nominal],
  ["Teff_sun", "solar effective temperature", solarEffectiveTemperature, "K", nominal],
  ["L_0", "luminosity of absolute bolometric magnitude 0", zeroMagnitudeLuminosity, "W", bolometric],
  ["f_0", "irradiance of apparent bolometric magnitude 0", zeroMagnitudeIrradiance, "W/m**2", bolometric],
].map(([name, meaning, value, unit, definedBy]) => ({ name, meaning, value, unit, definedBy }) as Constant);
