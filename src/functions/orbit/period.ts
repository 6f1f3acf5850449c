import { orbitalPeriods } from "../../kernel/orbitalPeriod.js";
import { type NumberDefinition, optional, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const period: NumberDefinition = {
  form: "number",
  name: "PERIOD",
  question: "How long does an orbit of this size take?",
  inputs: [
    required(quantity.axis),
    required(quantity.starMass),
    optional(quantity.planetMassOrNone, 0, "a planet of negligible mass"),
  ],
  result: { quantity: quantity.period, unit: "d" },
  compute: orbitalPeriods,
  formula: "P = 2 pi (a^3 / (G (M + m)))^(1/2); a axis, M star mass, m planet mass",
  source: "Kepler's third law in Newton's form; Murray & Correia 2010, in Exoplanets (ed. Seager)",
  examples: [
    {
      cells: ["1 AU", "1 solMass"],
      gives: "365.256898 d",
      because: "Gaussian year 2 pi / 0.01720209895 d (IAU 1976 System)",
    },
  ],
};
