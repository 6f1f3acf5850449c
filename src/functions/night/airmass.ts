import { airmasses } from "../../kernel/night/airmass.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { placeNote, starAtSite } from "./place.js";

export const airmass: NumberDefinition = {
  form: "number",
  name: "AIRMASS",
  question: "Through how much air is this star seen?",
  inputs: [required(quantity.timeAtSite), ...starAtSite],
  result: { quantity: quantity.airmass, unit: "1" },
  compute: airmasses,
  unanswered: "the star is below the horizon then; see ALTITUDE",
  formula:
    "X = (1.002432 c^2 + 0.148386 c + 0.0096467) / (c^3 + 0.149864 c^2 + 0.0102963 c + 0.000303978), c = sin h; h true altitude",
  source: "Young 1994, Appl. Opt. 33, 1108 (coefficients from memory)",
  note: `By Young (1994), from the true altitude; other formulas differ by 0.1 % at airmass 2 and 20 % at the horizon. ${placeNote}`,
  examples: [
    {
      cells: ["2453186.93002 JD_UTC", "60.91197 deg", "6.23828 deg", "5.7122 deg", "43.9308 deg"],
      gives: "1.32",
      because: "1 / sin 49.02 deg, the altitude by astropy 5.2.1",
    },
  ],
};
