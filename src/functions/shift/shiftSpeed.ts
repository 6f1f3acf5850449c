import { speedsOfShifts } from "../../kernel/speedOfShift.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { linearLimit, model } from "./model.js";

export const shiftSpeed: NumberDefinition = {
  form: "number",
  name: "SHIFTSPEED",
  question: "What speed makes this fractional shift?",
  inputs: [required(quantity.shift), model],
  result: { quantity: quantity.speed, unit: "m/s" },
  compute: speedsOfShifts,
  unanswered: linearLimit,
  formula: "v = c ((1 + z)^2 - 1) / ((1 + z)^2 + 1); linear: v = c z",
  source: "relativistic Doppler shift of radial motion, Wright & Eastman 2014, PASP 126, 838",
  examples: [{ cells: ["1E-4"], gives: "29977.7468377175 m/s", because: "computed with 60 digits (mpmath)" }],
};
