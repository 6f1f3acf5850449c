import { lineShifts } from "../../kernel/lineShift.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { linearLimit, model } from "./model.js";

export const lineShift: NumberDefinition = {
  form: "number",
  name: "LINESHIFT",
  question: "How far does a line move in wavelength?",
  inputs: [required(quantity.restWavelength), required(quantity.speed), model],
  result: { quantity: quantity.wavelengthShift, unit: "nm" },
  compute: lineShifts,
  unanswered: linearLimit,
  formula: "dlambda = lambda z, z the fractional shift of SHIFT",
  source: "relativistic Doppler shift of radial motion, Wright & Eastman 2014, PASP 126, 838",
  examples: [{ cells: ["550 nm", "12.5 m/s"], gives: "2.29325320E-5 nm", because: "computed with 60 digits (mpmath)" }],
};
