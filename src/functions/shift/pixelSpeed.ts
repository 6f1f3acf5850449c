import { pixelSpeeds } from "../../kernel/pixelSpeed.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const pixelSpeed: NumberDefinition = {
  form: "number",
  name: "PIXELSPEED",
  question: "What speed is this shift on the detector?",
  inputs: [required(quantity.pixelShift), required(quantity.resolvingPower), required(quantity.pixelsPerElement)],
  result: { quantity: quantity.speed, unit: "m/s" },
  compute: pixelSpeeds,
  formula: "v = dx c / (R s); R resolving power, s pixels per resolution element",
  source: "definition of the resolving power R = lambda / dlambda (common practice, no source)",
  examples: [
    { cells: ["1 pixel", "115000", "3.2"], gives: "814.65341848 m/s", because: "computed with 60 digits (mpmath)" },
  ],
};
