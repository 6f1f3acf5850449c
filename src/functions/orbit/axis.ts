import { semiMajorAxes } from "../../kernel/semiMajorAxis.js";
import { type NumberDefinition, optional, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const axis: NumberDefinition = {
  form: "number",
  name: "AXIS",
  question: "How far from its star does this planet orbit?",
  inputs: [
    required(quantity.period),
    required(quantity.starMass),
    optional(quantity.planetMassOrNone, 0, "a planet of negligible mass"),
  ],
  result: { quantity: quantity.axis, unit: "AU" },
  compute: semiMajorAxes,
  formula: "a = (G (M + m) P^2 / (4 pi^2))^(1/3); M star mass, m planet mass, P period",
  source: "Kepler's third law in Newton's form; Murray & Correia 2010, in Exoplanets (ed. Seager)",
  examples: [
    {
      cells: ["365.25 d", "1 solMass"],
      gives: "0.999987409034049 AU",
      because: "computed with 60 digits (mpmath) from IAU 2012 B2 and 2015 B3",
    },
    {
      cells: ["4332.589 d", "1 solMass", "1 jupiterMass"],
      gives: "5.203 AU",
      because: "semi-major axis of Jupiter, 5.203 au (common practice)",
    },
  ],
};
