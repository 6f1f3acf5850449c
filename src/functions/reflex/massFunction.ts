import { massFunctions } from "../../kernel/massFunction.js";
import { type NumberDefinition, optional, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const massFunction: NumberDefinition = {
  form: "number",
  name: "MASSFUNCTION",
  question: "What does the orbit say of the masses, whatever the star weighs?",
  inputs: [
    required(quantity.semiAmplitude),
    required(quantity.period),
    optional(quantity.eccentricity, 0, "a circular orbit"),
  ],
  result: { quantity: quantity.massFunction, unit: "solMass" },
  compute: massFunctions,
  formula: "f = (m sin i)^3 / (M + m)^2 = P K^3 (1 - e^2)^(3/2) / (2 pi G)",
  source: "Lovis & Fischer 2010, in Exoplanets (ed. Seager)",
  examples: [
    {
      cells: ["55.94 m/s", "4.230785 d", "0.013"],
      gives: "7.6718566E-11 solMass",
      because: "computed with 40 digits (mpmath) from IAU 2015 B3",
    },
  ],
};
