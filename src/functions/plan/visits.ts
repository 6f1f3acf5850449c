import { visitsExactlys, visitsNeededs } from "../../kernel/visitsNeeded.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { needsOmega, orbitSampling } from "./sampling.js";

export const visits: NumberDefinition = {
  form: "number",
  name: "VISITS",
  question: "How many visits measure this semi-amplitude?",
  inputs: [
    required(quantity.semiAmplitude),
    required(quantity.noise),
    required(quantity.significance),
    ...orbitSampling,
  ],
  result: { quantity: quantity.visits, unit: "1" },
  compute: visitsNeededs,
  beforeRounding: visitsExactlys,
  unanswered: needsOmega,
  formula:
    "N = (n sigma / K)^2 / H, rounded up, at least 4; H = s^2 (sin^2 omega + s cos^2 omega) / (1 + s), s = (1 - e^2)^(1/2), 1/2 for a circle; at the quadratures H = 1",
  source:
    "inverse Fisher matrix of K and the systemic velocity; circular case Cloutier et al. 2018, AJ 156, 82 (from memory)",
  note: "Period and times are taken as known and the noise as white. Few visits at random phases need more: by (1.07)^2 in the median for 8, (1.03)^2 for 20. A significance below 3 is no detection (common practice).",
  examples: [
    { cells: ["2.5 m/s", "3 m/s", "5"], gives: "72", because: "2 (5 x 3 / 2.5)^2, by hand" },
    { cells: ["2.5 m/s", "3 m/s", "5", "quadrature"], gives: "36", because: "half of it, at the quadratures" },
  ],
};
