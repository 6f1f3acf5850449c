import { day } from "../kernel/constants.js";
import { above, atLeast, atMost, below, type Quantity } from "./quantity.js";
import { timeAtSite } from "./timeQuantities.js";

const degree = Math.PI / 180;
// A limit converted from another unit can miss it by a rounding error.
const rounding = 1 + 1e-12;

export const night: Quantity = {
  ...timeAtSite,
  name: "night",
  meaning: "date at the observatory on whose evening the night begins; the time of day does not count",
  headers: ["night of", "evening date", "date of the night"],
};

export const altitude: Quantity = {
  name: "altitude",
  meaning: "angle above the horizon, without refraction",
  kind: "angle",
  lower: atLeast(-90 * degree * rounding, "-90 deg", "the nadir is the lowest"),
  upper: atMost(90 * degree * rounding, "90 deg", "the zenith is the highest"),
  unit: "deg",
  example: 45,
  step: 0.1 * degree,
  plausible: undefined,
  headers: ["alt", "elevation angle"],
};

export const lowestAltitude: Quantity = {
  ...altitude,
  name: "lowest altitude",
  meaning: "altitude above which the star counts as up, without refraction",
  lower: atLeast(0, "0", "below the horizon nothing can be seen"),
  upper: below(90 * degree, "90 deg", "nothing stands above the zenith"),
  example: 30,
  headers: ["minimum altitude", "altitude limit"],
};

export const sunBelow: Quantity = {
  ...altitude,
  name: "Sun below",
  meaning: "altitude of the Sun under which it is dark: -18 deg for astronomical twilight, -12 deg for nautical",
  lower: above(-90 * degree, "-90 deg", "the Sun cannot be deeper"),
  upper: atMost(0, "0", "with the Sun up there is no night"),
  example: -18,
  headers: ["twilight"],
};

export const hoursUp: Quantity = {
  name: "hours up",
  meaning: "time above the altitude while it is dark",
  kind: "duration",
  lower: atLeast(0, "0", "time does not run backwards"),
  upper: atMost(day * rounding, "24 h", "a night is no longer than a day"),
  unit: "h",
  example: 6,
  step: 60,
  plausible: { least: 0, most: day },
  headers: ["observable hours", "dark hours"],
};

export const moonDistance: Quantity = {
  name: "Moon distance",
  meaning: "angle between the star and the Moon",
  kind: "angle",
  lower: atLeast(0, "0", "an angle between two directions has no sign"),
  upper: atMost(180 * degree * rounding, "180 deg", "nothing is farther than the opposite point"),
  unit: "deg",
  example: 60,
  step: 0.1 * degree,
  plausible: undefined,
  headers: ["lunar distance", "Moon separation", "separation from the Moon"],
};

export const moonLit: Quantity = {
  name: "Moon lit",
  meaning: "part of the Moon's disk that the Sun lights",
  kind: "ratio",
  lower: atLeast(0, "0", "new moon has none"),
  upper: atMost(1, "1", "full moon has all"),
  unit: "1",
  example: 0.4,
  step: 0.01,
  plausible: undefined,
  headers: ["lunar illumination", "Moon illumination", "illuminated fraction"],
};
