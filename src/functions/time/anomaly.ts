import { anomalies } from "../../kernel/orbit/anomaly.js";
import { bendOfPeriod, bendOfTime } from "../../kernel/orbit/bend.js";
import { wholePeriodsOf } from "../../kernel/time/phase.js";
import { type Compute, type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";

const overTime: Compute = (rows, out, _time, period, _periastron, eccentricity) => {
  for (let row = 0; row < rows; row++) out[row] = bendOfTime(period![row]!, eccentricity![row]!);
};

const overPeriod: Compute = (rows, out, time, period, periastron, eccentricity) => {
  for (let row = 0; row < rows; row++) {
    out[row] = bendOfPeriod(time![row]!, period![row]!, periastron![row]!, eccentricity![row]!);
  }
};

const overEccentricity: Compute = (rows, out, _time, _period, _periastron, eccentricity) => {
  for (let row = 0; row < rows; row++) out[row] = 1 - eccentricity![row]!;
};

export const anomaly: NumberDefinition = {
  form: "number",
  name: "ANOMALY",
  question: "Where on its orbit is the body at this time?",
  inputs: [
    required(quantity.time),
    required(quantity.period),
    required(quantity.periastronTime),
    required(quantity.eccentricity),
    {
      takes: "word",
      name: "which",
      words: [
        { word: "true", meaning: "angle from periastron as seen from the focus" },
        { word: "eccentric", meaning: "as seen from the centre of the ellipse" },
        { word: "mean", meaning: "grows evenly with time" },
      ],
    },
  ],
  result: { quantity: quantity.anomaly, unit: "deg" },
  compute: anomalies,
  settle: wholePeriodsOf,
  scales: { time: overTime, "periastron time": overTime, period: overPeriod, eccentricity: overEccentricity },
  formula:
    "M = 2 pi (t - t_0) / P, E - e sin E = M, tan(nu/2) = ((1 + e) / (1 - e))^(1/2) tan(E/2); M mean, E eccentric, nu true anomaly, e eccentricity",
  source: "Kepler's equation, any text on celestial mechanics",
  note: "All times of a call are in one scale.",
  examples: [
    {
      cells: ["2459001 BJD_TDB", "6.283185307179586 d", "2459000 BJD_TDB", "0.5"],
      result: "rad",
      gives: "2.03080621485 rad",
      because: "mean anomaly 1, computed with 90 digits (mpmath)",
    },
    {
      cells: ["2459001 BJD_TDB", "6.283185307179586 d", "2459000 BJD_TDB", "0.5", "eccentric"],
      result: "rad",
      gives: "1.49870113352 rad",
      because: "mean anomaly 1, computed with 90 digits (mpmath)",
    },
  ],
};
