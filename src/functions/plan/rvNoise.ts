import { photonNoises } from "../../kernel/photonNoise.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { anchor, anchorNote, bothApertures } from "./anchor.js";

export const rvNoise: NumberDefinition = {
  form: "number",
  name: "RVNOISE",
  question: "How precise is one exposure of this star, given what the instrument did on another?",
  inputs: [required(quantity.magnitude), required(quantity.exposure), ...anchor],
  result: { quantity: quantity.photonNoise, unit: "m/s" },
  compute: photonNoises,
  unanswered: bothApertures,
  formula: "sigma = sigma_a 10^(0.2 (m - m_a)) (t_a / t)^(1/2) (D_a / D); the anchor's values carry the a",
  source: "Bouchy, Pepe & Queloz 2001, A&A 374, 733",
  note: anchorNote,
  examples: [
    {
      cells: ["9 mag", "900 s", "0.9 m/s", "6 mag", "60 s"],
      gives: "0.925117 m/s",
      because: "computed with mpmath; the anchor is ESO's HARPS overview page: 0.90 m/s at V = 6 in 1 min",
    },
    {
      cells: ["12 mag", "1800 s", "0.9 m/s", "6 mag", "60 s", "8.2 m", "3.57 m"],
      gives: "1.133799 m/s",
      because: "computed with mpmath from the same anchor",
    },
  ],
};
