import { exposuresForNoises } from "../../kernel/exposureForNoise.js";
import { type NumberDefinition, required } from "../definition.js";
import * as quantity from "../quantities.js";
import { anchor, anchorNote, bothApertures } from "./anchor.js";

export const exposure: NumberDefinition = {
  form: "number",
  name: "EXPOSURE",
  question: "How long must one exposure be for this photon noise?",
  inputs: [required(quantity.goalNoise), required(quantity.magnitude), ...anchor],
  result: { quantity: quantity.exposure, unit: "s" },
  compute: exposuresForNoises,
  unanswered: bothApertures,
  formula: "t = t_a (sigma_a / sigma)^2 10^(0.4 (m - m_a)) (D_a / D)^2; the anchor's values carry the a",
  source: "Bouchy, Pepe & Queloz 2001, A&A 374, 733",
  note: `${anchorNote} Split an exposure that would saturate.`,
  examples: [
    {
      cells: ["0.925117 m/s", "9 mag", "0.9 m/s", "6 mag", "60 s"],
      gives: "900.00 s",
      because: "the inverse of RVNOISE, computed with mpmath",
    },
  ],
};
