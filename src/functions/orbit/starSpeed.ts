import { starSpeeds } from "../../kernel/starSpeed.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const starSpeed: NumberDefinition = {
  form: "number",
  name: "STARSPEED",
  question: "How fast does the star move along its own orbit?",
  inputs: [required(quantity.period), required(quantity.starMass), required(quantity.planetMass)],
  result: { quantity: quantity.orbitalSpeed, unit: "m/s" },
  compute: starSpeeds,
  formula: "v = 2 pi a m / ((M + m) P); a axis of the relative orbit, M star mass, m planet mass, P period",
  source: "momentum balance about the barycentre; Murray & Correia 2010, in Exoplanets (ed. Seager)",
  note: "The speed of the circular motion with this period; on an eccentric orbit the speed varies about it. What a spectrograph sees of it is REFLEX.",
  examples: [
    {
      cells: ["4332.589 d", "1 solMass", "1 jupiterMass"],
      gives: "12.5 m/s",
      because: "about 12.5 m/s (common practice, no source)",
    },
  ],
};
