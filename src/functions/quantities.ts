export * from "./nightQuantities.js";
export * from "./planQuantities.js";

import {
  astronomicalUnit,
  day,
  jovianMassParameter,
  julianYear,
  solarMassParameter,
  speedOfLight,
  terrestrialMassParameter,
} from "../kernel/constants.js";
import { above, atLeast, atMost, below, type Quantity } from "./quantity.js";

export * from "./skyQuantities.js";
export * from "./timeQuantities.js";

const positive = (reason: string) => above(0, "0", reason);
const hasMass = positive("a body has mass");
const slowerThanLight = "nothing moves as fast as light";

export const period: Quantity = {
  name: "period",
  meaning: "orbital period",
  kind: "duration",
  lower: positive("an orbit takes time"),
  upper: undefined,
  unit: "d",
  example: 4.23,
  step: 86400,
  plausible: { least: 0.05 * day, most: 1e4 * julianYear },
  headers: ["P", "Per", "orbital period", "Porb", "P_orb"],
};

export const starMass: Quantity = {
  name: "star mass",
  meaning: "mass of the star",
  kind: "mass",
  lower: hasMass,
  upper: undefined,
  unit: "solMass",
  example: 1.1,
  step: solarMassParameter,
  plausible: { least: 0.05 * solarMassParameter, most: 60 * solarMassParameter },
  headers: ["Mstar", "M_star", "M*", "M_*", "Ms", "stellar mass", "mass of star", "host mass"],
};

export const planetMass: Quantity = {
  name: "planet mass",
  meaning: "mass of the planet",
  kind: "mass",
  lower: hasMass,
  upper: undefined,
  unit: "jupiterMass",
  example: 0.47,
  step: jovianMassParameter,
  plausible: { least: 0.005 * terrestrialMassParameter, most: 90 * jovianMassParameter },
  headers: ["Mp", "M_p", "Mplanet", "m", "mass", "companion mass", "mass of planet"],
};

/** Where the planet's own mass may be neglected. */
export const planetMassOrNone: Quantity = {
  ...planetMass,
  lower: atLeast(0, "0", "a mass is not negative"),
};

export const minimumMass: Quantity = {
  ...planetMass,
  name: "minimum mass",
  meaning: "mass of the planet if its orbit is seen edge-on (sin i = 1)",
  headers: ["m sin i", "msini", "Mp sin i", "minimum mass"],
};

export const totalMass: Quantity = {
  name: "total mass",
  meaning: "mass of star and planet together",
  kind: "mass",
  lower: hasMass,
  upper: undefined,
  unit: "solMass",
  example: 1.1,
  step: solarMassParameter,
  plausible: { least: 0.05 * solarMassParameter, most: 60 * solarMassParameter },
  headers: ["Mtot", "M_tot", "system mass"],
};

export const massFunction: Quantity = {
  name: "mass function",
  meaning: "spectroscopic mass function (m sin i)^3 / (M + m)^2",
  kind: "mass",
  lower: hasMass,
  upper: undefined,
  unit: "solMass",
  example: 7.6e-11,
  step: terrestrialMassParameter,
  plausible: undefined,
  headers: ["f(m)", "fm", "f(M)"],
};

export const axis: Quantity = {
  name: "axis",
  meaning: "semi-major axis of the orbit of the planet relative to the star",
  kind: "length",
  lower: positive("an orbit has a size"),
  upper: undefined,
  unit: "AU",
  example: 0.052,
  step: astronomicalUnit,
  plausible: { least: 0.003 * astronomicalUnit, most: 1e4 * astronomicalUnit },
  headers: ["a", "sma", "semi-major axis", "semimajor axis", "orbital radius"],
};

export const starAxis: Quantity = {
  ...axis,
  name: "star axis",
  meaning: "semi-major axis of the star's own orbit about the barycentre",
  example: 2.2e-5,
  plausible: undefined,
  headers: ["a_star", "a_1"],
};

export const orbitalSpeed: Quantity = {
  name: "orbital speed",
  meaning: "mean speed along the orbit about the barycentre",
  kind: "speed",
  lower: positive("a body in orbit moves"),
  upper: below(speedOfLight, "the speed of light", slowerThanLight),
  unit: "km/s",
  example: 30,
  step: 1,
  plausible: undefined,
  headers: ["v_orb", "orbital velocity"],
};

export const semiAmplitude: Quantity = {
  name: "K",
  meaning: "radial-velocity semi-amplitude of the star",
  kind: "speed",
  lower: positive("a planet moves its star"),
  upper: below(speedOfLight, "the speed of light", slowerThanLight),
  unit: "m/s",
  example: 55.9,
  step: 1,
  plausible: { least: 0.005, most: 1e5 },
  headers: ["RV semi-amplitude", "semi-amplitude", "semiamplitude", "RV amplitude", "K_star", "K1"],
};

export const eccentricity: Quantity = {
  name: "eccentricity",
  meaning: "eccentricity of the orbit",
  kind: "ratio",
  lower: atLeast(0, "0", "a circle is the roundest orbit"),
  upper: below(1, "1", "only bound orbits repeat"),
  unit: "1",
  example: 0.05,
  step: 1,
  plausible: undefined,
  headers: ["e", "ecc", "eccen"],
};

export const inclination: Quantity = {
  name: "inclination",
  meaning: "angle between the orbit's axis and the line of sight; 90 deg is edge-on",
  kind: "angle",
  lower: above(0, "0", "an orbit seen face-on shows no radial motion"),
  upper: below(Math.PI, "180 deg", "an orbit seen face-on shows no radial motion"),
  unit: "deg",
  example: 86.7,
  step: 1,
  plausible: { least: (5 * Math.PI) / 180, most: (175 * Math.PI) / 180 },
  headers: ["i", "inc", "incl", "orbital inclination"],
};

export const speed: Quantity = {
  name: "speed",
  meaning: "speed along the line of sight, receding positive",
  kind: "speed",
  lower: above(-speedOfLight, "minus the speed of light", slowerThanLight),
  upper: below(speedOfLight, "the speed of light", slowerThanLight),
  unit: "m/s",
  example: 12.5,
  step: 1,
  plausible: undefined,
  headers: ["v", "RV", "radial velocity", "velocity"],
};

export const shift: Quantity = {
  name: "shift",
  meaning: "fractional wavelength shift (observed - rest) / rest",
  kind: "ratio",
  lower: above(-1, "-1", "a wavelength is positive"),
  upper: undefined,
  unit: "1",
  example: 4.2e-8,
  step: 1e-8,
  plausible: undefined,
  headers: ["z", "Doppler shift", "dlambda/lambda"],
};

export const shiftAmplitude: Quantity = {
  ...shift,
  name: "shift",
  meaning: "amplitude of the fractional wavelength shift",
  lower: positive("a planet moves its star"),
};

const anyWavelength = {
  plausible: { least: 50e-9, most: 1e-3 },
  kind: "length",
  unit: "nm",
  example: 550,
  step: 1e-9,
};

export const restWavelength: Quantity = {
  ...anyWavelength,
  name: "rest wavelength",
  meaning: "wavelength of the line in the laboratory",
  lower: positive("a wavelength is positive"),
  upper: undefined,
  headers: ["lambda", "lambda0", "lambda_0", "wavelength"],
};

// A limit converted from another unit can miss it by a rounding error.
const rounding = 1e-12;
const shortest = atLeast(200e-9 * (1 - rounding), "200 nm", "air is opaque below and its index is not defined there");
const longest = atMost(2500e-9 * (1 + rounding), "2500 nm", "the published formulas were not measured beyond");

export const wavelengthInAir: Quantity = {
  ...anyWavelength,
  name: "wavelength in air",
  meaning: "wavelength in standard air",
  lower: shortest,
  upper: longest,
  headers: ["lambda_air", "air wavelength"],
};

export const wavelengthInVacuum: Quantity = {
  ...anyWavelength,
  name: "wavelength in vacuum",
  meaning: "wavelength in vacuum",
  lower: shortest,
  upper: longest,
  headers: ["lambda_vac", "vacuum wavelength"],
};

/** As results: a limit of one medium is not that of the other. */
export const airWavelength: Quantity = {
  ...wavelengthInAir,
  lower: positive("a wavelength is positive"),
  upper: undefined,
};

export const vacuumWavelength: Quantity = { ...wavelengthInVacuum, lower: airWavelength.lower, upper: undefined };

export const wavelengthShift: Quantity = {
  ...anyWavelength,
  plausible: undefined,
  name: "line shift",
  meaning: "how far a line moves in wavelength",
  lower: undefined,
  upper: undefined,
  example: 2.3e-5,
  step: 1e-14,
  headers: ["dlambda", "delta lambda"],
};

export const resolvingPower: Quantity = {
  name: "resolving power",
  meaning: "wavelength divided by the width (FWHM) of a resolution element",
  kind: "ratio",
  lower: positive("a spectrograph resolves something"),
  upper: undefined,
  unit: "1",
  example: 115000,
  step: 1e5,
  plausible: { least: 100, most: 1e6 },
  headers: ["R", "resolution", "resolving power"],
};

export const pixelsPerElement: Quantity = {
  name: "pixels per resolution element",
  meaning: "detector pixels across one resolution element (FWHM)",
  kind: "pixel",
  lower: positive("a resolution element covers detector"),
  upper: undefined,
  unit: "pixel",
  example: 3.2,
  step: 1,
  plausible: { least: 1, most: 20 },
  headers: ["sampling", "pixels per element"],
};

export const pixelShift: Quantity = {
  name: "pixel shift",
  meaning: "how far a line moves on the detector",
  kind: "pixel",
  lower: undefined,
  upper: undefined,
  unit: "pixel",
  example: 0.015,
  step: 1e-3,
  plausible: undefined,
  headers: ["shift in pixels", "dx"],
};
