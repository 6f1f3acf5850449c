import { moonLits } from "../../kernel/night/moonLit.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const moonLit: NumberDefinition = {
  form: "number",
  name: "MOONLIT",
  question: "How much of the Moon is lit?",
  inputs: [required(quantity.timeAtSite)],
  result: { quantity: quantity.moonLit, unit: "1" },
  compute: moonLits,
  formula: "k = (1 + cos i) / 2; i the angle between Sun and Earth as the Moon sees them",
  source:
    "Brown's lunar theory as cut down by Montenbruck & Pfleger 2000, Astronomy on the Personal Computer, sect. 3.2 (from memory)",
  note: "0 at new moon, 1 at full moon; good to 0.003.",
  examples: [{ cells: ["2450763.12747 JD_UTC"], gives: "0.79", because: "0.794 by astropy 5.2.1" }],
};
