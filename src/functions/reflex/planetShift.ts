import { planetShifts } from "../../kernel/planetShift.js";
import { type NumberDefinition, optional, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const planetShift: NumberDefinition = {
  form: "number",
  name: "PLANETSHIFT",
  question: "By what fraction does this planet shift the lines of its star?",
  inputs: [
    required(quantity.period),
    required(quantity.starMass),
    required(quantity.planetMass),
    optional(quantity.eccentricity, 0, "a circular orbit"),
    optional(quantity.inclination, Math.PI / 2, "90 deg, edge-on"),
  ],
  result: { quantity: quantity.shiftAmplitude, unit: "1" },
  compute: planetShifts,
  formula: "z = ((1 + K/c) / (1 - K/c))^(1/2) - 1 at the semi-amplitude K of REFLEX",
  source:
    "Lovis & Fischer 2010, in Exoplanets (ed. Seager), eq. 14; relativistic Doppler shift, Wright & Eastman 2014, PASP 126, 838",
  examples: [
    {
      cells: ["4332.589 d", "1 solMass", "1 jupiterMass"],
      gives: "4.15590186E-8",
      because: "computed with 40 digits (mpmath) from IAU 2015 B3",
    },
  ],
};
