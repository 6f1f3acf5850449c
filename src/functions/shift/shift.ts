import { shiftsOfSpeeds } from "../../kernel/shiftOfSpeed.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { linearLimit, model } from "./model.js";

export const shift: NumberDefinition = {
  form: "number",
  name: "SHIFT",
  question: "By what fraction does this speed shift a wavelength?",
  inputs: [required(quantity.speed), model],
  result: { quantity: quantity.shift, unit: "1" },
  compute: shiftsOfSpeeds,
  unanswered: linearLimit,
  formula: "z = ((1 + v/c) / (1 - v/c))^(1/2) - 1; linear: z = v/c",
  source: "relativistic Doppler shift of radial motion, Wright & Eastman 2014, PASP 126, 838",
  examples: [
    { cells: ["1 m/s"], gives: "3.3356409575448E-9", because: "computed with 60 digits (mpmath)" },
    { cells: ["1 m/s", "linear"], gives: "3.33564095198152E-9", because: "1 / 299792458, SI (2019)" },
  ],
};
