import { altitudes } from "../../kernel/night/altitude.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { placeNote, starAtSite } from "./place.js";

export const altitude: NumberDefinition = {
  form: "number",
  name: "ALTITUDE",
  question: "How high does this star stand?",
  inputs: [required(quantity.timeAtSite), ...starAtSite],
  result: { quantity: quantity.altitude, unit: "deg" },
  compute: altitudes,
  formula:
    "sin h = sin phi sin delta + cos phi cos delta cos H, of date; H hour angle, phi latitude, delta declination",
  source: "spherical trigonometry; Hilton et al. 2006, Celest. Mech. 94, 351 (precession)",
  note: `True altitude, without refraction; good to 0.01 deg. ${placeNote}`,
  examples: [
    {
      cells: ["2450763.12747 JD_UTC", "84.38383 deg", "-59.85811 deg", "-70.7345 deg", "-29.2584 deg"],
      gives: "11.5 deg",
      because: "11.525 deg by astropy 5.2.1",
    },
  ],
};
