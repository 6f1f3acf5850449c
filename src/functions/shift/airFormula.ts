import type { WordInput } from "../definition.js";

/** The words stand in the order of the kernel's formula codes. */
export const airFormula: WordInput = {
  takes: "word",
  name: "formula",
  words: [
    { word: "Ciddor1996", meaning: "Ciddor 1996, Appl. Opt. 35, 1566" },
    { word: "Morton2000", meaning: "Birch & Downs 1994 as used by Morton 2000, ApJS 130, 403" },
  ],
};
