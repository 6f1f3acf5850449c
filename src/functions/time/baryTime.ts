import { barycentricTimes } from "../../kernel/sky/barycentricTime.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { steady } from "./omega.js";

const radian = steady(1);

export const baryTime: NumberDefinition = {
  form: "number",
  name: "BARYTIME",
  question: "What is this time as BJD_TDB?",
  inputs: [
    required(quantity.timeAtSite),
    required(quantity.rightAscension),
    required(quantity.declination),
    required(quantity.longitude),
    required(quantity.latitude),
    required(quantity.height),
  ],
  result: { quantity: quantity.barycentricTime, unit: "BJD_TDB" },
  compute: barycentricTimes,
  scales: {
    time: steady(1),
    RA: radian,
    dec: radian,
    longitude: radian,
    latitude: radian,
    height: steady(1e8),
  },
  formula: "BJD_TDB = UTC + (TAI - UTC) + 32.184 s + (TDB - TT) + r.n/c; r place of the site, n direction of the star",
  source:
    "Eastman, Siverd & Gaudi 2010, PASP 122, 935; TDB - TT of USNO Circular 179; the Earth from a fit to epv00 of ERFA",
  note: "Plane waves: the curved wave front of the nearest star is worth 1 ms. One cell holds a Julian date to 4e-5 s; ask for BJD_TDB-2450000 for 2e-7 s. Leap seconds are known up to June 2026 and assumed unchanged up to 2036; a new one shifts the result by 1 s.",
  examples: [
    {
      cells: ["2010-03-05T06:00:00", "197 deg", "-30 deg", "-70.7345 deg", "-29.2584 deg", "2400 m"],
      gives: "2455260.75468409 BJD_TDB",
      because: "JD_UTC 2455260.75 + 0.0046840893 d by astropy 5.2.1 with its built-in ephemeris",
    },
  ],
};
