import { optional, type WordInput } from "../definition.js";
import * as quantity from "../quantities.js";

export const sampling: WordInput = {
  takes: "word",
  name: "sampling",
  words: [
    { word: "uniform", meaning: "visits spread evenly over the phases" },
    { word: "quadrature", meaning: "half of the visits at each extreme of the velocity" },
  ],
};

/** How the visits lie on the orbit. */
export const orbitSampling = [
  sampling,
  optional(quantity.eccentricity, 0, "a circular orbit"),
  // An eccentric orbit has no usual omega, and a guess would look like an answer.
  optional(quantity.omega, Number.NaN, "needed where visits to an eccentric orbit are uniform"),
] as const;

export const needsOmega =
  "uniform visits to an eccentric orbit need omega, the argument of periastron of the star's orbit";
