import { massVisitsExactlys, massVisitsOf } from "../../kernel/massVisits.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { orbitSampling } from "./sampling.js";

export const massVisits: NumberDefinition = {
  form: "number",
  name: "MASSVISITS",
  question: "How many visits measure the mass of this planet, the mass of its star being uncertain?",
  inputs: [
    required(quantity.semiAmplitude),
    required(quantity.noise),
    required(quantity.starMass),
    required(quantity.starMassError),
    required(quantity.significance),
    ...orbitSampling,
  ],
  result: { quantity: quantity.visits, unit: "1" },
  compute: massVisitsOf,
  beforeRounding: massVisitsExactlys,
  unanswered:
    "unreachable where 2/3 of the star's relative error is not below 1/significance; uniform visits with e above 0 need omega",
  formula:
    "N = (sigma / K)^2 / (H (1/n^2 - (2 sigma_M / (3 M))^2)), rounded up, at least 4; H as in VISITS, M mass of the star",
  source: "first-order propagation (JCGM 100:2008, 5.1.2) of m ~ K M^(2/3), the planet light beside its star",
  note: "Period, eccentricity and inclination are taken as known and the noise as white; see VISITS for few visits.",
  examples: [
    {
      cells: ["2.5 m/s", "3 m/s", "1 solMass", "0.05 solMass", "5"],
      gives: "75",
      because: "74.057 rounded up, computed with mpmath",
    },
  ],
};
