import { shiftMasses } from "../../kernel/shiftMass.js";
import { type NumberDefinition, optional, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const shiftMass: NumberDefinition = {
  form: "number",
  name: "SHIFTMASS",
  question: "What planet makes this wavelength shift?",
  inputs: [
    required(quantity.shiftAmplitude),
    required(quantity.period),
    required(quantity.starMass),
    optional(quantity.eccentricity, 0, "a circular orbit"),
    optional(quantity.inclination, Math.PI / 2, "90 deg, edge-on"),
  ],
  result: { quantity: quantity.planetMass, unit: "jupiterMass" },
  compute: shiftMasses,
  formula: "K = c ((1 + z)^2 - 1) / ((1 + z)^2 + 1), then the mass as PLANETMASS solves it",
  source:
    "relativistic Doppler shift, Wright & Eastman 2014, PASP 126, 838; binary mass function, Lovis & Fischer 2010",
  examples: [
    {
      cells: ["4.15590186E-8", "4332.589 d", "1 solMass"],
      gives: "1.000 jupiterMass",
      because: "the inverse of PLANETSHIFT, computed with 40 digits (mpmath)",
    },
  ],
};
