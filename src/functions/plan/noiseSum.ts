import { noiseSums } from "../../kernel/noiseSum.js";
import { type NumberDefinition, repeating } from "../definition.js";
import * as quantity from "../quantities.js";

export const noiseSum: NumberDefinition = {
  form: "number",
  name: "NOISESUM",
  question: "What is the noise of these sources together?",
  inputs: [repeating(quantity.noiseTerm)],
  result: { quantity: quantity.noiseSum, unit: "m/s" },
  compute: noiseSums,
  formula: "sigma = (sigma_1^2 + sigma_2^2 + ...)^(1/2)",
  source: "addition of independent variances, JCGM 100:2008, 5.1.2",
  note: "Only photon noise falls with the root of the exposures: add the floor of the instrument and the activity of the star after averaging, not before.",
  examples: [
    { cells: ["3 m/s", "4 m/s"], gives: "5 m/s", because: "3, 4, 5" },
    { cells: ["2 m/s", "3 m/s", "6 m/s"], gives: "7 m/s", because: "4 + 9 + 36 = 49" },
  ],
};
