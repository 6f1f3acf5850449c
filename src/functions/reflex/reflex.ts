import { reflexAmplitudes } from "../../kernel/reflexAmplitude.js";
import { type NumberDefinition, optional, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const reflex: NumberDefinition = {
  form: "number",
  name: "REFLEX",
  question: "How fast does this planet make its star move along the line of sight?",
  inputs: [
    required(quantity.period),
    required(quantity.starMass),
    required(quantity.planetMass),
    optional(quantity.eccentricity, 0, "a circular orbit"),
    optional(quantity.inclination, Math.PI / 2, "90 deg, edge-on"),
  ],
  result: { quantity: quantity.semiAmplitude, unit: "m/s" },
  compute: reflexAmplitudes,
  formula:
    "K = (2 pi G / P)^(1/3) m sin i / ((M + m)^(2/3) (1 - e^2)^(1/2)); P period, M star mass, m planet mass, e eccentricity, i inclination",
  source: "Lovis & Fischer 2010, in Exoplanets (ed. Seager), eq. 14, in GM form",
  examples: [
    {
      cells: ["11.862 yr", "1 solMass", "1 jupiterMass"],
      gives: "12.5 m/s",
      because: "about 12.5 m/s for the Sun moved by Jupiter (common practice, no source)",
    },
    {
      cells: ["1 yr", "1 solMass", "1 earthMass"],
      gives: "0.09 m/s",
      because: "about 0.09 m/s for the Sun moved by the Earth (common practice, no source)",
    },
  ],
};
