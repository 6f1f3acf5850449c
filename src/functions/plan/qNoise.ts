import { qualityNoises } from "../../kernel/qualityNoise.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const qNoise: NumberDefinition = {
  form: "number",
  name: "QNOISE",
  question: "What photon noise follows from the quality factor of a spectrum and its photoelectrons?",
  inputs: [required(quantity.qualityFactor), required(quantity.photoelectrons)],
  result: { quantity: quantity.photonNoise, unit: "m/s" },
  compute: qualityNoises,
  formula: "sigma = c / (Q N^(1/2)); Q quality factor, N photoelectrons in the whole spectrum",
  source: "Bouchy, Pepe & Queloz 2001, A&A 374, 733 (from memory)",
  note: "Q depends on the star's temperature, metals and rotation, on the resolving power and on the band: take it from a spectrum like yours. 30 % is a usual error.",
  examples: [{ cells: ["1e4", "2.5e9"], gives: "0.599584916 m/s", because: "computed with mpmath" }],
};
