import { telescopeTimes } from "../../kernel/telescopeTime.js";
import { type NumberDefinition, optional, required } from "../definition.js";
import * as quantity from "../quantities.js";

export const hours: NumberDefinition = {
  form: "number",
  name: "HOURS",
  question: "How much telescope time do these visits cost?",
  inputs: [
    required(quantity.visits),
    required(quantity.exposure),
    required(quantity.overhead),
    optional(quantity.efficiency, 1, "1, no time is lost"),
  ],
  result: { quantity: quantity.telescopeTime, unit: "h" },
  compute: telescopeTimes,
  formula: "T = N (t + o) / eta; N visits, t exposure, o overhead, eta efficiency",
  source: "arithmetic",
  examples: [
    { cells: ["24", "900 s", "300 s"], gives: "8 h", because: "24 x 20 min, by hand" },
    { cells: ["24", "900 s", "300 s", "0.8"], gives: "10 h", because: "24 x 20 min / 0.8, by hand" },
  ],
};
