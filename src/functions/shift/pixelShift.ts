import { pixelShifts } from "../../kernel/pixelShift.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const pixelShift: NumberDefinition = {
  form: "number",
  name: "PIXELSHIFT",
  question: "How many detector pixels is this speed?",
  inputs: [required(quantity.speed), required(quantity.resolvingPower), required(quantity.pixelsPerElement)],
  result: { quantity: quantity.pixelShift, unit: "pixel" },
  compute: pixelShifts,
  formula: "dx = v R s / c; R resolving power, s pixels per resolution element",
  source: "definition of the resolving power R = lambda / dlambda (common practice, no source)",
  examples: [
    { cells: ["1 m/s", "115000", "3.2"], gives: "1.22751587E-3 pixel", because: "computed with 60 digits (mpmath)" },
  ],
};
