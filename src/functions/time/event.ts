import { eventNumbers, eventTimes } from "../../kernel/orbit/orbitalEvent.js";
import { type Compute, type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { omegaOfStar, orbitEccentricity, steady } from "./omega.js";

const overPeriod: Compute = (rows, out, _which, _after, period) => {
  for (let row = 0; row < rows; row++) out[row] = period![row]!;
};

const overEccentricity: Compute = (rows, out, _which, _after, _period, _reference, eccentricity) => {
  for (let row = 0; row < rows; row++) out[row] = 1 - eccentricity![row]!;
};

export const event: NumberDefinition = {
  form: "number",
  name: "EVENT",
  question: "When are the next transits, occultations, or extremes of the radial velocity?",
  inputs: [
    {
      takes: "word",
      name: "which",
      required: true,
      // In the order of the kernel's codes.
      words: [
        { word: "transit", meaning: "the planet passes in front of the star" },
        { word: "occultation", meaning: "the planet passes behind the star" },
        { word: "rv-high", meaning: "the star recedes fastest" },
        { word: "rv-low", meaning: "the star approaches fastest" },
        { word: "quadrature", meaning: "either of these two, whichever comes next" },
        { word: "periastron", meaning: "star and planet are closest" },
      ],
    },
    required({ ...quantity.time, meaning: "instant after which to look" }, "after"),
    required(quantity.period),
    required(quantity.referenceTime),
    orbitEccentricity,
    omegaOfStar,
    { takes: "count", name: "count", meaning: "how many events, below each other", most: 10000 },
  ],
  result: { quantity: quantity.eventTime, unit: "BJD_TDB", as: "reference time" },
  compute: eventTimes,
  settle: eventNumbers,
  scales: { period: overPeriod, eccentricity: overEccentricity, omega: steady(1) },
  formula:
    "t = t_0 + n P + (M_event - M_transit) P / (2 pi); transit at nu + omega = 90 deg, occultation at 270, rv-high at 0, rv-low at 180",
  source: "Winn 2010, in Exoplanets (ed. Seager), arXiv:1001.2010; linear propagation of errors, JCGM 100:2008",
  note: "The reference time is that of a transit. Omega is that of the star's orbit; a planet's omega differs by 180 deg. The result is in the scale and zero of the reference time; its uncertainty takes period and reference time as independent.",
  examples: [
    {
      cells: ["occultation", "2459000.5 BJD_TDB", "10 d", "2459000.5 BJD_TDB", "0.3", "0 deg"],
      gives: "2459007.38081168 BJD_TDB",
      because: "phase 0.688081167609 after transit, computed with 60 digits (mpmath)",
    },
    {
      cells: ["transit", "2460000 BJD_TDB", "3 d", "2459000.5 BJD_TDB"],
      gives: "2460002.5 BJD_TDB",
      because: "334 periods after the reference time",
    },
  ],
};
