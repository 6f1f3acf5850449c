import type { UnitChoice } from "./problem.js";

const jupiterMass = { symbol: "jupiterMass", meaning: "Jupiter mass" };
const earthMass = { symbol: "earthMass", meaning: "Earth mass" };
const solMass = { symbol: "solMass", meaning: "solar mass" };
const minute = { symbol: "min", meaning: "minute" };

/** Spellings that tables use for two different units. They are refused, because the wrong one looks right. */
export const ambiguousUnits: Readonly<Record<string, readonly UnitChoice[]>> = {
  M: [solMass, jupiterMass, earthMass, { symbol: "mag", meaning: "magnitude" }],
  R: [
    { symbol: "solRad", meaning: "solar radius" },
    { symbol: "jupiterRad", meaning: "Jupiter radius" },
    { symbol: "earthRad", meaning: "Earth radius" },
  ],
  L: [{ symbol: "solLum", meaning: "solar luminosity" }],
  as: [
    { symbol: "arcsec", meaning: "second of arc" },
    { symbol: "10**-18s", meaning: "attosecond" },
  ],
  MJ: [jupiterMass, { symbol: "10**6J", meaning: "megajoule" }],
  Mj: [jupiterMass, { symbol: "10**6J", meaning: "megajoule" }],
  RJ: [
    { symbol: "jupiterRad", meaning: "Jupiter radius" },
    { symbol: "10**27J", meaning: "ronnajoule" },
  ],
  Me: [earthMass, { symbol: "9.1093837E-31kg", meaning: "electron mass" }],
  ME: [earthMass, { symbol: "9.1093837E-31kg", meaning: "electron mass" }],
  M_e: [earthMass, { symbol: "9.1093837E-31kg", meaning: "electron mass" }],
  Re: [
    { symbol: "earthRad", meaning: "Earth radius" },
    { symbol: "solRad", meaning: "solar radius" },
  ],
  RE: [
    { symbol: "earthRad", meaning: "Earth radius" },
    { symbol: "solRad", meaning: "solar radius" },
  ],
  Ms: [solMass, { symbol: "10**6s", meaning: "megasecond" }],
  MS: [solMass, { symbol: "10**6s", meaning: "megasecond" }],
  mn: [minute, { symbol: "d", meaning: "day; a month has no fixed length" }],
  mon: [{ symbol: "d", meaning: "day; a month has no fixed length" }],
  month: [{ symbol: "d", meaning: "day; a month has no fixed length" }],
  months: [{ symbol: "d", meaning: "day; a month has no fixed length" }],
  "'": [minute, { symbol: "arcmin", meaning: "minute of arc" }],
  '"': [
    { symbol: "arcsec", meaning: "second of arc" },
    { symbol: "s", meaning: "second" },
  ],
  JD: [
    { symbol: "JD_UTC", meaning: "Julian date, UTC" },
    { symbol: "BJD_TDB", meaning: "barycentric Julian date, TDB" },
  ],
  MJD: [
    { symbol: "MJD_UTC", meaning: "modified Julian date, UTC" },
    { symbol: "MJD_TDB", meaning: "modified Julian date, TDB" },
  ],
  BJD: [
    { symbol: "BJD_TDB", meaning: "barycentric Julian date, TDB" },
    { symbol: "BJD_UTC", meaning: "barycentric Julian date, UTC" },
  ],
  HJD: [
    { symbol: "HJD_UTC", meaning: "heliocentric Julian date, UTC" },
    { symbol: "HJD_TDB", meaning: "heliocentric Julian date, TDB" },
  ],
};
