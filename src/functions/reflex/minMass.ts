import { planetMasses } from "../../kernel/planetMass.js";
import { type NumberDefinition, optional, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const minMass: NumberDefinition = {
  form: "number",
  name: "MINMASS",
  question: "What is the smallest planet that gives this semi-amplitude?",
  inputs: [
    required(quantity.semiAmplitude),
    required(quantity.period),
    required(quantity.starMass),
    optional(quantity.eccentricity, 0, "a circular orbit"),
  ],
  result: { quantity: quantity.minimumMass, unit: "jupiterMass" },
  compute: (rows, out, amplitude, period, starMass, eccentricity) => {
    planetMasses(rows, out, amplitude!, period!, starMass!, eccentricity!, edgeOn(rows));
  },
  formula:
    "m^3 / (M + m)^2 = P K^3 (1 - e^2)^(3/2) / (2 pi G), solved exactly for m; the planet seen edge-on, sin i = 1",
  source:
    "binary mass function, Lovis & Fischer 2010, in Exoplanets (ed. Seager); the cubic is solved in closed form without cancellation",
  note: "Not the product m sin i: the mass stands in M + m too, so the mass at another inclination is PLANETMASS, not this divided by sin i.",
  examples: [
    {
      cells: ["55.94 m/s", "4.230785 d", "1.09 solMass", "0.013"],
      gives: "0.472 jupiterMass",
      because: "51 Peg b, Butler et al. 2006, ApJ 646, 505 (K and star mass from memory)",
    },
  ],
};

let edgeOnColumn = new Float64Array(0);

/** A column of right angles at least `rows` long, kept because every call needs the same one. */
function edgeOn(rows: number): Float64Array {
  if (edgeOnColumn.length < rows) edgeOnColumn = new Float64Array(rows).fill(Math.PI / 2);
  return edgeOnColumn;
}
