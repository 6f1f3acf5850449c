import * as constant from "../kernel/constants.js";

/** One unit that can be read. Its scale is SI (a mass: G times the mass), `times` in the numerator and `over` below. */
export interface UnitRow {
  readonly symbol: string;
  readonly meaning: string;
  readonly times: number;
  readonly over: number;
  /** Added after scaling; only temperatures with another zero have one. */
  readonly plus: number;
  /** Its dimension as the dimensional algebra spells it; empty for a plain number. */
  readonly dimension: string;
  /** May carry an SI prefix. */
  readonly prefixes: boolean;
  /** Other ways to write the symbol, capitals as given. */
  readonly spellings: readonly string[];
  /** Words of the language, capitals ignored. */
  readonly words: readonly string[];
  readonly source: string;
}

interface Options {
  readonly over?: number;
  readonly plus?: number;
  readonly prefixes?: boolean;
  readonly spellings?: readonly string[];
  readonly words?: readonly string[];
  readonly source?: string;
}

function row(symbol: string, meaning: string, times: number, dimension: string, options: Options = {}): UnitRow {
  return {
    symbol,
    meaning,
    times,
    dimension,
    over: options.over ?? 1,
    plus: options.plus ?? 0,
    prefixes: options.prefixes ?? false,
    spellings: options.spellings ?? [],
    words: options.words ?? [],
    source: options.source ?? standard,
  };
}

const standard = "IVOA VOUnits 1.1";
const practice = "common practice";
const prefixed = { prefixes: true };
const G = constant.gravitationalConstant;

/**
 * Every unit that Barycell reads, in one place. The first rows of a dimension are what its columns mostly carry.
 * "common practice": written so in catalogues and tables of the trade, without one authority.
 */
export const unitTable: readonly UnitRow[] = [
  row("s", "second", 1, "s", { ...prefixed, spellings: ["sec"], words: ["second", "seconds", "secs"] }),
  row("min", "minute", 60, "s", { ...prefixed, words: ["minute", "minutes", "mins"] }),
  row("h", "hour", 3600, "s", { ...prefixed, spellings: ["hr", "hrs"], words: ["hour", "hours"] }),
  row("d", "day of 86400 s", 86400, "s", { ...prefixed, words: ["day", "days"] }),
  row("yr", "Julian year of 365.25 d", 31557600, "s", { ...prefixed, spellings: ["yrs"], words: ["year", "years"] }),
  row("a", "Julian year of 365.25 d", 31557600, "s", prefixed),
  row("cy", "Julian century", 3155760000, "s", { words: ["century", "centuries"], source: "FITS 4.0" }),
  row("wk", "week of 7 d", 604800, "s", { words: ["week", "weeks"], source: practice }),
  row("ta", "tropical year (J2000, 365.24219 d)", 365.24219 * 86400, "s"),
  row("Ba", "Besselian year (365.2421988 d)", 365.2421988 * 86400, "s"),

  row("m", "metre", 1, "m", { ...prefixed, words: ["metre", "metres", "meter", "meters"] }),
  row("AU", "astronomical unit (IAU 2012 B2)", constant.astronomicalUnit, "m", {
    spellings: ["au", "a.u."],
    words: ["astronomical unit", "astronomical units"],
  }),
  row("solRad", "solar radius (IAU 2015 B3 nominal)", constant.solarRadius, "m", {
    ...prefixed,
    spellings: ["Rsun", "R_sun", "RSun", "R_Sun", "Rsol", "R\u2609", "R_\u2609", "R\u2299", "R_\u2299"],
    words: ["solar radius", "solar radii"],
  }),
  row("jupiterRad", "Jupiter radius (IAU 2015 B3 nominal, equatorial)", constant.jovianEquatorialRadius, "m", {
    spellings: ["Rjup", "R_jup", "RJup", "R_Jup", "R_J", "jovRad", "R\u2643", "R_\u2643"],
    words: ["jupiter radius", "jupiter radii"],
    source: practice,
  }),
  row("earthRad", "Earth radius (IAU 2015 B3 nominal, equatorial)", constant.terrestrialEquatorialRadius, "m", {
    spellings: ["Rearth", "R_earth", "REarth", "R_Earth", "R_E", "Rgeo", "geoRad", "R\u2295", "R_\u2295"],
    words: ["earth radius", "earth radii"],
    source: practice,
  }),
  row("pc", "parsec (IAU 2015 B2)", constant.parsec, "m", { ...prefixed, words: ["parsec", "parsecs"] }),
  row("lyr", "light year", constant.lightYear, "m", { ...prefixed, words: ["light year", "light years"] }),
  row("Angstrom", "angstrom, 0.1 nm", 1, "m", {
    over: 1e10,
    spellings: ["angstrom", "\u00c5", "\u212b", "Ang"],
    words: ["angstroms"],
  }),
  row("micron", "micrometre", 1, "m", { over: 1e6, words: ["microns"], source: practice }),

  row("solMass", "solar mass (IAU 2015 B3 nominal, as GM)", constant.solarMassParameter, "kg", {
    ...prefixed,
    spellings: ["Msun", "M_sun", "MSun", "M_Sun", "Msol", "M\u2609", "M_\u2609", "M\u2299", "M_\u2299"],
    words: ["solar mass", "solar masses"],
  }),
  row("jupiterMass", "Jupiter mass (IAU 2015 B3 nominal, as GM)", constant.jovianMassParameter, "kg", {
    spellings: ["Mjup", "M_jup", "MJup", "M_Jup", "M_J", "Mjupiter", "jovMass", "M\u2643", "M_\u2643"],
    words: ["jupiter mass", "jupiter masses"],
    source: practice,
  }),
  row("earthMass", "Earth mass (IAU 2015 B3 nominal, as GM)", constant.terrestrialMassParameter, "kg", {
    spellings: ["Mearth", "M_earth", "MEarth", "M_Earth", "M_E", "Mgeo", "geoMass", "M\u2295", "M_\u2295"],
    words: ["earth mass", "earth masses"],
    source: practice,
  }),
  row("kg", "kilogram (as GM, with the CODATA value of G)", G, "kg", { words: ["kilogram", "kilograms"] }),
  row("g", "gram (as GM, with the CODATA value of G)", G, "kg", { over: 1000, ...prefixed, words: ["gram", "grams"] }),
  row("u", "atomic mass unit", G * constant.atomicMassConstant, "kg", prefixed),

  row("deg", "degree", Math.PI / 180, "rad", {
    ...prefixed,
    spellings: ["\u00b0", "d:m:s", "dms"],
    words: ["degree", "degrees", "degs"],
  }),
  row("rad", "radian", 1, "rad", { ...prefixed, words: ["radian", "radians"] }),
  row("arcmin", "minute of arc", Math.PI, "rad", { over: 10800, ...prefixed, spellings: ["\u2032"] }),
  row("arcsec", "second of arc", Math.PI, "rad", { over: 648000, ...prefixed, spellings: ["\u2033"] }),
  row("mas", "thousandth of a second of arc", Math.PI, "rad", { over: 648000000 }),
  row("hourangle", "hour of right ascension, 15 deg", Math.PI, "rad", {
    over: 12,
    spellings: ["h:m:s", "hms"],
    source: practice,
  }),
  row("sr", "steradian", 1, "rad^2", prefixed),

  row("1", "plain number", 1, "", { spellings: ["-", "--"], words: ["dimensionless", "none", "unitless"] }),
  row("%", "per cent", 1, "", { over: 100, words: ["percent", "per cent"] }),
  row("ppm", "parts per million", 1, "", { over: 1e6, source: practice }),
  row("ppb", "parts per billion (10**-9)", 1, "", { over: 1e9, source: practice }),
  row("ppt", "parts per thousand", 1, "", { over: 1000, source: practice }),

  row("mag", "magnitude", 1, "magnitudeBase", { ...prefixed, words: ["magnitude", "magnitudes", "mags"] }),
  row("pixel", "detector pixel", 1, "pixelBase", { ...prefixed, spellings: ["pix", "px"], words: ["pixels"] }),
  row("count", "count", 1, "countBase", { ...prefixed, spellings: ["ct", "cts"], words: ["counts"] }),
  row("photon", "photon", 1, "countBase", { ...prefixed, spellings: ["ph"], words: ["photons"] }),
  row("electron", "photoelectron", 1, "countBase", {
    prefixes: true,
    spellings: ["e-"],
    words: ["electrons"],
    source: practice,
  }),
  row("adu", "analogue-to-digital unit", 1, "aduBase", prefixed),
  row("bin", "histogram bin", 1, "binBase", prefixed),
  row("chan", "detector channel", 1, "channelBase", prefixed),
  row("beam", "beam", 1, "beamBase", prefixed),
  row("voxel", "volume element", 1, "voxelBase", prefixed),
  row("bit", "bit", 1, "bitBase", prefixed),
  row("byte", "byte of 8 bit", 8, "bitBase", { ...prefixed, spellings: ["B"] }),
  row("dB", "decibel", 1, "decibelBase"),

  row("Hz", "hertz", 1, "s^-1", prefixed),
  row("K", "kelvin", 1, "K", { ...prefixed, words: ["kelvin"] }),
  row("degC", "degree Celsius", 1, "K", {
    plus: 273.15,
    spellings: ["\u00b0C"],
    words: ["deg C", "celsius"],
    source: "SI brochure",
  }),
  row("N", "newton", 1, "kg m s^-2", prefixed),
  row("Pa", "pascal", 1, "kg m^-1 s^-2", prefixed),
  row("bar", "bar", 1e5, "kg m^-1 s^-2", { ...prefixed, source: "SI brochure" }),
  row("J", "joule", 1, "kg m^2 s^-2", prefixed),
  row("erg", "erg", 1, "kg m^2 s^-2", { over: 1e7, ...prefixed }),
  row("eV", "electronvolt", constant.elementaryCharge, "kg m^2 s^-2", prefixed),
  row(
    "Ry",
    "Rydberg energy, 13.605693122994 eV (CODATA 2018)",
    13.605693122994 * constant.elementaryCharge,
    "kg m^2 s^-2",
    prefixed,
  ),
  row("W", "watt", 1, "kg m^2 s^-3", prefixed),
  row("solLum", "solar luminosity (IAU 2015 B3 nominal)", constant.solarLuminosity, "kg m^2 s^-3", {
    ...prefixed,
    spellings: ["Lsun", "L_sun", "LSun", "L_Sun", "L\u2609", "L_\u2609", "L\u2299", "L_\u2299"],
    words: ["solar luminosity", "solar luminosities"],
  }),
  row("Jy", "jansky", 1, "kg s^-2", { over: 1e26, ...prefixed }),
  row("barn", "barn", 1, "m^2", { over: 1e28, ...prefixed }),
  row("A", "ampere", 1, "A", prefixed),
  row("C", "coulomb", 1, "A s", prefixed),
  row("D", "debye", 1, "A s m", { over: 1e21 * constant.speedOfLight, ...prefixed }),
  row("V", "volt", 1, "kg m^2 s^-3 A^-1", prefixed),
  row("Ohm", "ohm", 1, "kg m^2 s^-3 A^-2", { ...prefixed, spellings: ["\u03a9", "\u2126"] }),
  row("S", "siemens", 1, "kg^-1 m^-2 s^3 A^2", prefixed),
  row("F", "farad", 1, "kg^-1 m^-2 s^4 A^2", prefixed),
  row("H", "henry", 1, "kg m^2 s^-2 A^-2", prefixed),
  row("Wb", "weber", 1, "kg m^2 s^-2 A^-1", prefixed),
  row("T", "tesla", 1, "kg s^-2 A^-1", prefixed),
  row("G", "gauss", 1, "kg s^-2 A^-1", { over: 1e4, ...prefixed }),
  row("mol", "mole", 1, "mol", prefixed),
  row("cd", "candela", 1, "cd", prefixed),
  row("lm", "lumen", 1, "cd rad^2", prefixed),
  row("lx", "lux", 1, "cd rad^2 m^-2", prefixed),
];
