import { bendOfPeriod, bendOfTime } from "../../kernel/orbit/bend.js";
import { radialVelocities } from "../../kernel/orbit/radialVelocity.js";
import { type Compute, type NumberDefinition, optional, required, type WordInput } from "../definition.js";
import * as quantity from "../quantities.js";
import { omegaOfStar, orbitEccentricity, steady } from "./omega.js";

const overTime: Compute = (rows, out, _time, period, _amplitude, _reference, eccentricity) => {
  for (let row = 0; row < rows; row++) out[row] = bendOfTime(period![row]!, eccentricity![row]!);
};

const overPeriod: Compute = (rows, out, time, period, _amplitude, reference, eccentricity) => {
  for (let row = 0; row < rows; row++) {
    out[row] = bendOfPeriod(time![row]!, period![row]!, reference![row]!, eccentricity![row]!);
  }
};

const overAmplitude: Compute = (rows, out, _time, _period, amplitude) => {
  for (let row = 0; row < rows; row++) out[row] = amplitude![row]!;
};

const overEccentricity: Compute = (rows, out, _time, _period, _amplitude, _reference, eccentricity) => {
  for (let row = 0; row < rows; row++) out[row] = 1 - eccentricity![row]!;
};

/** The words stand in the order of the kernel's codes. */
const event: WordInput = {
  takes: "word",
  name: "reference",
  words: [
    { word: "transit", meaning: "the reference time is that of a transit (inferior conjunction)" },
    { word: "periastron", meaning: "the reference time is that of a periastron" },
  ],
};

export const rvAt: NumberDefinition = {
  form: "number",
  name: "RVAT",
  question: "What radial velocity does the star have at this time?",
  inputs: [
    required(quantity.time),
    required(quantity.period),
    required(quantity.semiAmplitude),
    required(quantity.referenceTime),
    orbitEccentricity,
    omegaOfStar,
    optional(quantity.systemicVelocity, 0, "0"),
    event,
  ],
  result: { quantity: quantity.radialVelocity, unit: "m/s" },
  compute: radialVelocities,
  scales: {
    time: overTime,
    "reference time": overTime,
    period: overPeriod,
    K: overAmplitude,
    eccentricity: overEccentricity,
    omega: steady(1),
  },
  formula:
    "V = gamma + K (cos(nu + omega) + e cos omega); nu true anomaly, omega argument of periastron of the star's orbit; transit at nu + omega = 90 deg",
  source: "Lovis & Fischer 2010, in Exoplanets (ed. Seager); Wright & Howard 2009, ApJS 182, 205",
  note: "Omega is that of the star's orbit; a planet's omega differs by 180 deg. All times of a call are in one scale. A Julian date in one cell is good to 4e-5 s; with BJD_TDB-2450000 a cell holds 2e-7 s.",
  examples: [
    {
      cells: ["2459001.5 BJD_TDB", "4 d", "50 m/s", "2459000.5 BJD_TDB"],
      gives: "-50.0 m/s",
      because: "a quarter of a circular orbit after the transit the star approaches fastest",
    },
    {
      cells: ["2459000.5 BJD_TDB", "4 d", "50 m/s", "2459000.5 BJD_TDB", "0.3", "360 deg", "1 km/s", "periastron"],
      gives: "1065.0 m/s",
      because: "gamma + K (1 + e) where periastron is at the node, V = gamma + K (cos(nu + omega) + e cos omega)",
    },
  ],
};
