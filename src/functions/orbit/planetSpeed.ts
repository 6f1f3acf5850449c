import { planetSpeeds } from "../../kernel/planetSpeed.js";
import { type NumberDefinition, optional, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const planetSpeed: NumberDefinition = {
  form: "number",
  name: "PLANETSPEED",
  question: "How fast does the planet move along its orbit?",
  inputs: [
    required(quantity.period),
    required(quantity.starMass),
    optional(quantity.planetMassOrNone, 0, "a planet of negligible mass"),
  ],
  result: { quantity: quantity.orbitalSpeed, unit: "km/s" },
  compute: planetSpeeds,
  formula: "v = 2 pi a M / ((M + m) P); a axis of the relative orbit, M star mass, m planet mass, P period",
  source: "momentum balance about the barycentre; Murray & Correia 2010, in Exoplanets (ed. Seager)",
  note: "The speed of the circular motion with this period; on an eccentric orbit the speed varies about it.",
  examples: [
    {
      cells: ["365.256363 d", "1 solMass", "1 earthMass"],
      gives: "29.78 km/s",
      because: "mean orbital speed of the Earth, 29.78 km/s (from memory)",
    },
  ],
};
