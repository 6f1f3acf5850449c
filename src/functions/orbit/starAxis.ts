import { starAxes } from "../../kernel/starAxis.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const starAxis: NumberDefinition = {
  form: "number",
  name: "STARAXIS",
  question: "How large is the star's own orbit about the barycentre?",
  inputs: [required(quantity.period), required(quantity.starMass), required(quantity.planetMass)],
  result: { quantity: quantity.starAxis, unit: "AU" },
  compute: starAxes,
  formula: "a_star = a m / (M + m), a = (G (M + m) P^2 / (4 pi^2))^(1/3); M star mass, m planet mass, P period",
  source: "momentum balance about the barycentre; Murray & Correia 2010, in Exoplanets (ed. Seager)",
  examples: [
    {
      cells: ["4332.589 d", "1 solMass", "1 jupiterMass"],
      result: "solRad",
      gives: "1.067 solRad",
      because:
        "Jupiter moves the Sun by a little more than its radius (common practice); computed with 60 digits (mpmath)",
    },
  ],
};
