import { planetMasses } from "../../kernel/planetMass.js";
import { type NumberDefinition, optional, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const planetMass: NumberDefinition = {
  form: "number",
  name: "PLANETMASS",
  question: "What mass has the planet, from its semi-amplitude and inclination?",
  inputs: [
    required(quantity.semiAmplitude),
    required(quantity.period),
    required(quantity.starMass),
    required(quantity.inclination),
    optional(quantity.eccentricity, 0, "a circular orbit"),
  ],
  result: { quantity: quantity.planetMass, unit: "jupiterMass" },
  compute: (rows, out, amplitude, period, starMass, inclination, eccentricity) => {
    planetMasses(rows, out, amplitude!, period!, starMass!, eccentricity!, inclination!);
  },
  formula: "(m sin i)^3 / (M + m)^2 = P K^3 (1 - e^2)^(3/2) / (2 pi G), solved exactly for m",
  source:
    "binary mass function, Lovis & Fischer 2010, in Exoplanets (ed. Seager); the cubic is solved in closed form without cancellation",
  examples: [
    {
      cells: ["84.67 m/s", "3.52474859 d", "1.119 solMass", "86.71 deg"],
      gives: "0.685 jupiterMass",
      because: "HD 209458 b, Torres, Winn & Holman 2008, ApJ 677, 1324 (K, star mass from memory)",
    },
  ],
};
