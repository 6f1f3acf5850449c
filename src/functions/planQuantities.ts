import { day, solarMassParameter, speedOfLight } from "../kernel/constants.js";
import { above, atLeast, atMost, below, type Quantity } from "./quantity.js";

const positive = (reason: string) => above(0, "0", reason);
const fasterIsNothing = below(speedOfLight, "the speed of light", "nothing moves as fast as light");

export const magnitude: Quantity = {
  name: "magnitude",
  meaning: "apparent magnitude of the star",
  kind: "magnitude",
  lower: atLeast(-30, "-30 mag", "the Sun itself is at -26.7"),
  upper: atMost(40, "40 mag", "nothing so faint can be observed"),
  unit: "mag",
  example: 9,
  step: 1,
  plausible: { least: -2, most: 22 },
  headers: ["mag", "Vmag", "Gmag", "Jmag", "Hmag", "Kmag", "V", "G", "J", "H", "apparent magnitude", "brightness"],
};

/** Of the star on which an instrument was measured. */
export const anchorMagnitude: Quantity = {
  ...magnitude,
  name: "anchor magnitude",
  meaning: "magnitude of the star on which the anchor noise was measured, in the same band",
  example: 6,
  plausible: undefined,
  headers: [],
};

export const exposure: Quantity = {
  name: "exposure",
  meaning: "open-shutter time of one visit",
  kind: "duration",
  lower: positive("light takes time to gather"),
  upper: undefined,
  unit: "s",
  example: 900,
  step: 60,
  plausible: { least: 1, most: day },
  headers: ["exposure time", "exptime", "t_exp", "texp"],
};

export const anchorExposure: Quantity = {
  ...exposure,
  name: "anchor exposure",
  meaning: "exposure in which the anchor noise was measured",
  example: 60,
  plausible: undefined,
  headers: [],
};

export const noise: Quantity = {
  name: "noise",
  meaning: "uncertainty of the radial velocity of one visit",
  kind: "speed",
  lower: positive("no measurement is without noise"),
  upper: fasterIsNothing,
  unit: "m/s",
  example: 1.2,
  step: 1,
  plausible: { least: 0.05, most: 1000 },
  headers: ["noise per visit", "sigma_RV", "RV noise", "RV precision", "precision"],
};

export const goalNoise: Quantity = { ...noise, name: "goal noise", meaning: "photon noise aimed at", headers: [] };

export const anchorNoise: Quantity = {
  ...noise,
  name: "anchor noise",
  meaning: "photon noise measured with this instrument on a star of the same kind",
  example: 0.9,
  plausible: undefined,
  headers: [],
};

export const photonNoise: Quantity = {
  ...noise,
  name: "photon noise",
  meaning: "photon noise of the radial velocity of one visit",
  headers: ["photon noise"],
};

/** One of several that add up; one that is not there is 0. */
export const noiseTerm: Quantity = {
  ...noise,
  meaning: "one source of noise, independent of the others",
  lower: atLeast(0, "0", "a noise has no sign"),
  // Without the speed of light as a bound, which is so far away that derivatives would be taken on the way to it.
  upper: undefined,
  headers: [],
};

export const noiseSum: Quantity = {
  ...noise,
  name: "noise sum",
  meaning: "noise of all sources together",
  headers: ["total noise", "noise budget"],
  lower: noiseTerm.lower,
  upper: undefined,
};

export const aperture: Quantity = {
  name: "aperture",
  meaning: "diameter of the telescope's aperture",
  kind: "length",
  lower: positive("a telescope gathers light through an opening"),
  upper: atMost(1000, "1000 m", "no telescope is so wide"),
  unit: "m",
  example: 3.6,
  step: 0.1,
  plausible: { least: 0.1, most: 50 },
  headers: ["telescope diameter", "D_tel"],
};

export const anchorAperture: Quantity = {
  ...aperture,
  name: "anchor aperture",
  meaning: "aperture with which the anchor noise was measured",
  example: 3.6,
  plausible: undefined,
  headers: [],
};

export const obstruction: Quantity = {
  ...aperture,
  name: "obstruction",
  meaning: "diameter of the central obstruction",
  lower: atLeast(0, "0", "a diameter is not negative"),
  example: 0.8,
  plausible: undefined,
  headers: ["central obstruction"],
};

export const qualityFactor: Quantity = {
  name: "quality factor",
  meaning: "quality factor Q of the spectrum: how much velocity each photon tells",
  kind: "ratio",
  lower: positive("a spectrum without lines tells no velocity"),
  upper: undefined,
  unit: "1",
  example: 10000,
  step: 1000,
  plausible: { least: 100, most: 1e6 },
  headers: ["Q", "Q factor"],
};

export const photoelectrons: Quantity = {
  name: "photoelectrons",
  meaning: "photoelectrons in the whole spectrum",
  kind: "count",
  lower: positive("without light there is no measurement"),
  upper: undefined,
  unit: "count",
  example: 2.5e9,
  step: 1e6,
  plausible: undefined,
  headers: ["electrons", "N_e"],
};

const wholePart = (reason: string) => ({
  lower: positive(reason),
  upper: atMost(1, "1", "a part is not more than all"),
});

export const throughput: Quantity = {
  name: "throughput",
  meaning: "part of the light that is detected, from the telescope to the detector",
  kind: "ratio",
  ...wholePart("an instrument without throughput sees nothing"),
  unit: "1",
  example: 0.05,
  step: 0.01,
  plausible: { least: 0.001, most: 0.8 },
  headers: ["total throughput", "eta"],
};

export const bandWidth: Quantity = {
  name: "band width",
  meaning: "width of the wavelength range that counts",
  kind: "length",
  lower: positive("light of no range of wavelengths is none"),
  upper: undefined,
  unit: "nm",
  example: 90,
  step: 1e-9,
  plausible: { least: 1e-11, most: 1e-5 },
  headers: ["bandwidth"],
};

export const extinction: Quantity = {
  name: "extinction",
  meaning: "extinction of the atmosphere at airmass 1",
  kind: "magnitude",
  lower: atLeast(0, "0", "air adds no light"),
  upper: atMost(2.5, "2.5 mag", "no observatory has such air"),
  unit: "mag",
  example: 0.12,
  step: 0.1,
  plausible: { least: 0.01, most: 1 },
  headers: ["extinction coefficient"],
};

export const airmass: Quantity = {
  name: "airmass",
  meaning: "air that the light crosses, relative to the zenith",
  kind: "ratio",
  lower: atLeast(1, "1", "the zenith has the least air"),
  upper: atMost(40, "40", "at the horizon it is 38"),
  unit: "1",
  example: 1.2,
  step: 0.1,
  plausible: { least: 1, most: 5 },
  headers: ["air mass", "sec z", "secz"],
};

export const significance: Quantity = {
  name: "significance",
  meaning: "value divided by its uncertainty",
  kind: "ratio",
  lower: positive("a detection has a significance"),
  upper: undefined,
  unit: "1",
  example: 5,
  step: 1,
  plausible: { least: 0.5, most: 1000 },
  headers: ["sigma level", "detection significance", "K/sigma_K"],
};

export const visits: Quantity = {
  name: "visits",
  meaning: "number of visits, one radial velocity each",
  kind: "ratio",
  lower: atLeast(1, "1", "less than one visit is none"),
  upper: undefined,
  unit: "1",
  example: 24,
  step: 1,
  plausible: { least: 1, most: 10000 },
  headers: ["N_RV", "N_visits", "n_obs", "RV visits"],
};

/** As many as show that a velocity changes. */
export const severalVisits: Quantity = {
  ...visits,
  lower: atLeast(2, "2", "one visit alone cannot show that a velocity changes"),
};

export const starMassError: Quantity = {
  name: "star mass error",
  meaning: "standard uncertainty of the star mass",
  kind: "mass",
  lower: atLeast(0, "0", "an uncertainty has no sign"),
  upper: undefined,
  unit: "solMass",
  example: 0.05,
  step: solarMassParameter,
  plausible: undefined,
  headers: [],
};

export const overhead: Quantity = {
  name: "overhead",
  meaning: "time of one visit in which the shutter is closed",
  kind: "duration",
  lower: atLeast(0, "0", "time does not run backwards"),
  upper: undefined,
  unit: "s",
  example: 300,
  step: 60,
  plausible: { least: 0, most: day },
  headers: ["overheads", "overhead time"],
};

export const efficiency: Quantity = {
  name: "efficiency",
  meaning: "part of the time given that weather and faults leave",
  kind: "ratio",
  ...wholePart("without usable time there is no plan"),
  unit: "1",
  example: 0.75,
  step: 0.1,
  plausible: { least: 0.1, most: 1 },
  headers: ["usable fraction", "weather efficiency"],
};

export const telescopeTime: Quantity = {
  name: "telescope time",
  meaning: "telescope time of all visits",
  kind: "duration",
  lower: positive("visits take time"),
  upper: undefined,
  unit: "h",
  example: 12,
  step: 3600,
  plausible: undefined,
  headers: ["hours", "cost", "time needed", "total time"],
};
