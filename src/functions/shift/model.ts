import type { WordInput } from "../definition.js";

/** The words stand in the order of the kernel's model codes. */
export const model: WordInput = {
  takes: "word",
  name: "model",
  words: [
    { word: "relativistic", meaning: "motion along the line of sight, special relativity" },
    { word: "linear", meaning: "v / c, up to a tenth of the speed of light" },
  ],
};

export const linearLimit =
  "the linear model is refused above a tenth of the speed of light; leave the model out for the relativistic one";
