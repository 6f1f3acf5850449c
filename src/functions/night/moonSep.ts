import { moonDistances } from "../../kernel/night/moonDistance.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { starAtSite } from "./place.js";

export const moonSep: NumberDefinition = {
  form: "number",
  name: "MOONSEP",
  question: "How far is this star from the Moon?",
  inputs: [required(quantity.timeAtSite), ...starAtSite],
  result: { quantity: quantity.moonDistance, unit: "deg" },
  compute: moonDistances,
  formula: "cos d = n.m / |m|; n towards the star, m from the site to the Moon",
  source:
    "Brown's lunar theory as cut down by Montenbruck & Pfleger 2000, Astronomy on the Personal Computer, sect. 3.2 (from memory)",
  note: "As the site sees them, whether or not they are up; good to 0.1 deg.",
  examples: [
    {
      cells: ["2450763.12747 JD_UTC", "84.38383 deg", "-59.85811 deg", "-70.7345 deg", "-29.2584 deg"],
      gives: "88 deg",
      because: "87.55 deg by astropy 5.2.1",
    },
  ],
};
