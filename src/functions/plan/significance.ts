import { visitSignificances } from "../../kernel/visitSignificance.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { needsOmega, orbitSampling } from "./sampling.js";

export const significance: NumberDefinition = {
  form: "number",
  name: "SIGNIFICANCE",
  question: "How significant is this semi-amplitude after so many visits?",
  inputs: [
    required(quantity.semiAmplitude),
    required(quantity.noise),
    required(quantity.severalVisits),
    ...orbitSampling,
  ],
  result: { quantity: quantity.significance, unit: "1" },
  compute: visitSignificances,
  unanswered: needsOmega,
  formula: "K / sigma_K = (K / sigma) (N H)^(1/2); H as in VISITS; an odd number at the quadratures counts as N - 1/N",
  source:
    "inverse Fisher matrix of K and the systemic velocity; circular case Cloutier et al. 2018, AJ 156, 82 (from memory)",
  note: "Period and times are taken as known and the noise as white. Few visits at random phases give less: 7 % in the median for 8, 3 % for 20.",
  examples: [
    { cells: ["2.5 m/s", "3 m/s", "72"], gives: "5", because: "(2.5 / 3)(72 / 2)^(1/2), by hand" },
    { cells: ["2.5 m/s", "3 m/s", "36", "quadrature"], gives: "5", because: "(2.5 / 3) 36^(1/2), by hand" },
  ],
};
