import { totalMasses } from "../../kernel/totalMass.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const totalMass: NumberDefinition = {
  form: "number",
  name: "TOTALMASS",
  question: "What mass do star and planet have together, from the size and period of the orbit?",
  inputs: [required(quantity.axis), required(quantity.period)],
  result: { quantity: quantity.totalMass, unit: "solMass" },
  compute: totalMasses,
  formula: "M + m = 4 pi^2 a^3 / (G P^2); a axis, P period",
  source: "Kepler's third law in Newton's form; Murray & Correia 2010, in Exoplanets (ed. Seager)",
  examples: [
    {
      cells: ["1 AU", "365.256898 d"],
      gives: "1.0000000 solMass",
      because: "Gaussian year 2 pi / 0.01720209895 d (IAU 1976 System)",
    },
  ],
};
