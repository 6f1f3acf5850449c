import { speedOfLight } from "../kernel/constants.js";
import { firstLeapSecond, leapSecondsAssumedUntil } from "../kernel/time/leapSeconds.js";
import { above, atLeast, atMost, below, type Quantity } from "./quantity.js";

const degree = Math.PI / 180;
const longAgo = -73048.5;
const farOff = 73048.5;
const noSuchDate = "no table of this trade reaches so far; look for another zero of the date (JD, MJD, JD-2450000)";

/** An instant in the scale and at the place that its unit states. */
export const time: Quantity = {
  name: "time",
  meaning: "instant of an observation",
  kind: "instant",
  zeroIsBlank: true,
  lower: atLeast(longAgo, "1800-01-01", noSuchDate),
  upper: below(farOff, "2200-01-01", noSuchDate),
  unit: "BJD_TDB",
  example: 2460310.25,
  step: 1,
  plausible: { least: -36524, most: 36525 },
  headers: ["t", "BJD", "JD", "MJD", "HJD", "obs time", "time of observation", "observation time"],
};

/** An instant on the clock of the site, from which leap seconds and the turn of the Earth follow. */
export const timeAtSite: Quantity = {
  ...time,
  frame: "JD_UTC",
  meaning: "when, at the observatory: middle of the exposure, weighted by the light where it is known",
  lower: atLeast(firstLeapSecond, "1972-01-01", "leap seconds begin there"),
  upper: below(leapSecondsAssumedUntil, "2036-01-01", "leap seconds and the ephemeris are not known beyond"),
  unit: "JD_UTC",
  plausible: { least: firstLeapSecond, most: leapSecondsAssumedUntil },
  headers: [...time.headers, "UTC", "mid-exposure time"],
};

export const referenceTime: Quantity = {
  ...time,
  name: "reference time",
  meaning: "when a known event took place, mostly a transit",
  example: 2459000.5,
  headers: ["T0", "Tc", "T_0", "T_c", "Tconj", "transit time", "time of transit", "mid-transit time", "epoch"],
};

export const periastronTime: Quantity = {
  ...time,
  name: "periastron time",
  meaning: "when the star and its planet were closest",
  example: 2459000.5,
  headers: ["Tp", "T_p", "Tperi", "T_peri", "time of periastron", "periastron passage"],
};

export const eventTime: Quantity = {
  ...time,
  name: "event time",
  meaning: "when the event takes place",
  headers: ["next transit", "next event"],
};

export const barycentricTime: Quantity = {
  ...time,
  name: "barycentric time",
  meaning: "when the light would have passed the barycentre of the solar system",
  headers: [],
};

export const omega: Quantity = {
  name: "omega",
  meaning: "argument of periastron of the star's orbit; the planet's differs by 180 deg",
  kind: "angle",
  lower: atLeast(-360 * degree * (1 + 1e-12), "-360 deg", "a turn is a turn"),
  upper: atMost(360 * degree * (1 + 1e-12), "360 deg", "a turn is a turn"),
  unit: "deg",
  example: 58,
  step: 1,
  plausible: undefined,
  headers: ["w", "argument of periastron", "arg of periastron", "omega_star", "om", "\u03c9", "argument of periapsis"],
};

export const systemicVelocity: Quantity = {
  name: "systemic velocity",
  meaning: "velocity of the system along the line of sight, receding positive",
  kind: "speed",
  lower: above(-speedOfLight, "minus the speed of light", "nothing moves as fast as light"),
  upper: below(speedOfLight, "the speed of light", "nothing moves as fast as light"),
  unit: "m/s",
  example: -33250,
  step: 1,
  plausible: undefined,
  headers: ["gamma", "systemic RV", "RV offset", "v_sys", "Vsys", "system velocity"],
};

export const radialVelocity: Quantity = {
  ...systemicVelocity,
  name: "radial velocity",
  meaning: "velocity of the star along the line of sight, receding positive",
  example: 12.5,
  headers: ["RV", "predicted RV", "model RV"],
};

export const barycentricCorrection: Quantity = {
  ...systemicVelocity,
  name: "barycentric correction",
  meaning: "barycentric correction c z_B, to be applied as (1 + z)(1 + z_B)",
  example: 19557.9989,
  headers: ["BERV", "barycentric velocity", "BVC"],
};

export const phase: Quantity = {
  name: "phase",
  meaning: "part of a period that has passed since the last event of the reference",
  kind: "ratio",
  lower: atLeast(0, "0", "a phase is counted from 0 to 1"),
  upper: below(1, "1", "a phase is counted from 0 to 1"),
  unit: "1",
  example: 0.25,
  step: 0.01,
  plausible: undefined,
  headers: ["orbital phase"],
};

export const anomaly: Quantity = {
  name: "anomaly",
  meaning: "angle from periastron, from 0 to 360 deg",
  kind: "angle",
  lower: undefined,
  upper: undefined,
  unit: "deg",
  example: 90,
  step: 1,
  plausible: undefined,
  headers: ["true anomaly", "mean anomaly", "eccentric anomaly", "nu"],
};
