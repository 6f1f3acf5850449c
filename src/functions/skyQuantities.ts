import { julianYear } from "../kernel/constants.js";
import { atLeast, atMost, below, type Quantity } from "./quantity.js";

const degree = Math.PI / 180;
const milliarcsecond = degree / 3600000;
// A limit converted from another unit can miss it by a rounding error.
const rounding = 1 + 1e-12;

/** Hours where its header or its text says so: `RA [h]`, `13:08:00`. */
export const rightAscension: Quantity = {
  name: "RA",
  meaning: "right ascension of the star, ICRS",
  kind: "angle",
  sexagesimal: "hours",
  zeroIsBlank: true,
  lower: atLeast(0, "0", "right ascension is counted from 0 to 24 h"),
  upper: atMost(360 * degree * rounding, "360 deg (24 h)", "right ascension is counted from 0 to 24 h"),
  unit: "deg",
  example: 197.0,
  step: 0.01,
  plausible: undefined,
  headers: ["right ascension", "RAJ2000", "RA_ICRS", "RAdeg", "_RAJ2000", "ra_deg"],
};

export const declination: Quantity = {
  name: "dec",
  meaning: "declination of the star, ICRS",
  kind: "angle",
  sexagesimal: "degrees",
  zeroIsBlank: true,
  lower: atLeast(-90 * degree * rounding, "-90 deg", "the celestial poles stand at 90 deg"),
  upper: atMost(90 * degree * rounding, "90 deg", "the celestial poles stand at 90 deg"),
  unit: "deg",
  example: -30.0,
  step: 0.01,
  plausible: undefined,
  headers: ["declination", "DEJ2000", "DE_ICRS", "DEdeg", "_DEJ2000", "DE", "dec_deg"],
};

export const longitude: Quantity = {
  name: "longitude",
  meaning: "longitude of the observatory, east positive",
  kind: "angle",
  sexagesimal: "degrees",
  zeroIsBlank: true,
  lower: atLeast(-180 * degree * rounding, "-180 deg", "the Earth is round; east of Greenwich is positive"),
  upper: atMost(360 * degree * rounding, "360 deg", "the Earth is round; east of Greenwich is positive"),
  unit: "deg",
  example: -70.7345,
  step: 0.01,
  plausible: undefined,
  headers: ["lon", "site longitude", "east longitude", "geodetic longitude"],
};

export const latitude: Quantity = {
  name: "latitude",
  meaning: "geodetic latitude of the observatory (WGS 84), north positive",
  kind: "angle",
  sexagesimal: "degrees",
  zeroIsBlank: true,
  lower: atLeast(-90 * degree * rounding, "-90 deg", "the poles stand at 90 deg"),
  upper: atMost(90 * degree * rounding, "90 deg", "the poles stand at 90 deg"),
  unit: "deg",
  example: -29.2584,
  step: 0.01,
  plausible: undefined,
  headers: ["lat", "site latitude", "geodetic latitude"],
};

export const height: Quantity = {
  name: "height",
  meaning: "height of the observatory above the ellipsoid (WGS 84); sea level is within 0.1 km",
  kind: "length",
  zeroIsBlank: true,
  lower: atLeast(-1000, "-1 km", "no observatory lies deeper"),
  upper: below(100000, "100 km", "space begins there, and the site would no longer turn with the Earth"),
  unit: "m",
  example: 2400,
  step: 100,
  plausible: { least: -100, most: 6000 },
  headers: ["elevation", "site height", "elev", "altitude above sea level"],
};

const notSoFast = "no star moves faster than 11 arcsec a year";

export const properMotionEast: Quantity = {
  name: "pm RA",
  meaning: "proper motion in right ascension times cos(dec), as catalogues give it",
  kind: "angular speed",
  lower: atLeast((-20000 * milliarcsecond) / julianYear, "-20 arcsec/yr", notSoFast),
  upper: atMost((20000 * milliarcsecond) / julianYear, "20 arcsec/yr", notSoFast),
  unit: "mas/yr",
  example: 120,
  step: milliarcsecond / julianYear,
  plausible: undefined,
  headers: ["pmRA", "pm_RA", "pmRA*", "pm RA cos dec", "proper motion in RA", "mu_alpha", "pmra_cosdec"],
};

export const properMotionNorth: Quantity = {
  ...properMotionEast,
  name: "pm dec",
  meaning: "proper motion in declination",
  example: -45,
  headers: ["pmDE", "pmDec", "pm_dec", "pm_DE", "proper motion in dec", "mu_delta"],
};

export const parallax: Quantity = {
  name: "parallax",
  meaning: "parallax of the star; 0 for one too far away to show any",
  kind: "angle",
  lower: atLeast(0, "0", "a parallax below 0 is noise; type 0"),
  upper: atMost(2000 * milliarcsecond, "2 arcsec", "no star is nearer than half a parsec"),
  unit: "mas",
  example: 35.5,
  step: milliarcsecond,
  plausible: { least: 0.01 * milliarcsecond, most: 800 * milliarcsecond },
  headers: ["plx", "Plx", "parallax_mas", "pi", "varpi"],
};

export const epoch: Quantity = {
  name: "epoch",
  meaning: "Julian year for which position and proper motion hold: 2016 for J2016.0",
  kind: "duration",
  lower: atLeast(1800 * julianYear, "1800 yr", "catalogues hold for years from 1800 to 2200"),
  upper: atMost(2200 * julianYear, "2200 yr", "catalogues hold for years from 1800 to 2200"),
  unit: "yr",
  example: 2016,
  step: julianYear,
  plausible: { least: 1900 * julianYear, most: 2050 * julianYear },
  headers: ["ref_epoch", "Epoch", "reference epoch", "catalogue epoch"],
};
