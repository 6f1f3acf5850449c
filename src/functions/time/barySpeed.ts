import { barycentricSpeeds } from "../../kernel/sky/barycentricSpeed.js";
import { type Compute, type NumberDefinition, neededBy, optional, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { steady } from "./omega.js";

const overParallax: Compute = (rows, out, ...columns) => {
  const parallax = columns[8]!;
  for (let row = 0; row < rows; row++) out[row] = parallax[row]!;
};

const hour = 1 / 24;
const radian = steady(1);
const arcsecPerYear = Math.PI / 648000 / quantity.epoch.step;

export const barySpeed: NumberDefinition = {
  form: "number",
  name: "BARYSPEED",
  question: "How much does the observatory's own motion change a measured radial velocity?",
  inputs: [
    required(quantity.timeAtSite),
    required(quantity.rightAscension),
    required(quantity.declination),
    required(quantity.longitude),
    required(quantity.latitude),
    required(quantity.height),
    optional(quantity.properMotionEast, 0, "0"),
    optional(quantity.properMotionNorth, 0, "0"),
    optional(quantity.parallax, 0, "0, a star too far away to show any"),
    neededBy(
      ["pm RA", "pm dec"],
      "a moving star needs the year for which its position holds (2016 yr for J2016.0)",
      quantity.epoch,
      2000 * quantity.epoch.step,
      "2000 yr",
    ),
  ],
  result: { quantity: quantity.barycentricCorrection, unit: "m/s" },
  compute: barycentricSpeeds,
  scales: {
    time: steady(hour),
    RA: radian,
    dec: radian,
    longitude: radian,
    latitude: radian,
    height: steady(1e5),
    "pm RA": steady(arcsecPerYear),
    "pm dec": steady(arcsecPerYear),
    parallax: overParallax,
  },
  formula:
    "1 + z_B = gamma (1 + v.n/c) / ((1 + Phi/c^2)(1 + v_star.n/c)), the result is c z_B; v velocity of the site, Phi potential of Sun and Earth, v_star the star's own motion across the sky",
  source:
    "Wright & Eastman 2014, PASP 126, 838; IAU 2006 precession, IAU 2000B nutation, WGS 84; the Earth from a fit to epv00 of ERFA (2 mm/s)",
  note: "Apply it as (1 + z)(1 + z_B), not by adding. With proper motion and parallax it takes out the star's secular acceleration since the epoch, too. UT1 is taken as UTC, which is worth up to 0.03 m/s. Leap seconds are known up to June 2026 and assumed unchanged up to 2036; a new one shifts the result by up to 0.04 m/s.",
  examples: [
    {
      cells: ["2010-03-05T06:00:00", "197 deg", "-30 deg", "-70.7345 deg", "-29.2584 deg", "2400 m"],
      gives: "19558.00 m/s",
      because: "19557.9989 m/s by astropy 5.2.1 with its built-in ephemeris and UT1 = UTC",
    },
    {
      cells: ["2458279.5625 JD_UTC", "19:02:43.0613", "50:14:28.666", "-17.889 deg", "28.754 deg", "2387 m"],
      gives: "6590.42 m/s",
      because: "6590.4224 m/s by astropy 5.2.1 with its built-in ephemeris and UT1 = UTC",
    },
  ],
};
