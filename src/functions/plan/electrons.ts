import { bands, photoelectronCounts } from "../../kernel/photoelectrons.js";
import { type NumberDefinition, optional, required, type WordInput } from "../definition.js";
import * as quantity from "../quantities.js";

const wavelengths = [366, 438, 545, 641, 798, 1220, 1630, 2190];

const band: WordInput = {
  takes: "word",
  name: "band",
  required: true,
  words: bands.map((word, index) => ({ word, meaning: `about ${wavelengths[index]} nm` })),
};

export const electrons: NumberDefinition = {
  form: "number",
  name: "ELECTRONS",
  question: "How many photoelectrons does this star give in one exposure?",
  inputs: [
    required(quantity.magnitude),
    band,
    required(quantity.aperture),
    required(quantity.throughput),
    required(quantity.exposure),
    required(quantity.bandWidth),
    optional(quantity.obstruction, 0, "none"),
    optional(quantity.extinction, 0, "none, the throughput includes the air"),
    optional(quantity.airmass, Number.NaN, "needed where there is an extinction"),
  ],
  result: { quantity: quantity.photoelectrons, unit: "count" },
  compute: photoelectronCounts,
  unanswered: "the obstruction must be narrower than the aperture, and an extinction needs the airmass",
  formula:
    "N = (pi/4)(D^2 - d^2) eta t F 10^(-0.4 (m + k X)) w; F photons from magnitude 0, k extinction, X airmass, w band width",
  source: "Bessell, Castelli & Plez 1998, A&A 333, 231, photon fluxes",
  note: "The flux is that at the middle of the band: beyond about 100 nm add bands up. Losses at the slit or fibre belong to the throughput, and are often a factor 2. A throughput that includes the air takes no extinction.",
  examples: [
    {
      cells: ["0 mag", "V", "1 cm", "1", "1 s", "0.1 nm"],
      gives: "782 count",
      because: "995.5 photons cm-2 s-1 A-1 (Bessell, Castelli & Plez 1998) times pi/4 cm2 and 1 A, by hand",
    },
  ],
};
