import { optional, required } from "../definition.js";
import * as quantity from "../quantities.js";

/** What was measured once with an instrument, from which other stars are scaled. */
export const anchor = [
  required(quantity.anchorNoise),
  required(quantity.anchorMagnitude),
  required(quantity.anchorExposure),
  optional(quantity.aperture, 0, "that of the anchor"),
  optional(quantity.anchorAperture, 0, "the same telescope"),
] as const;

export const bothApertures = "give the aperture and that of the anchor together, or leave both out";

export const anchorNote =
  "Holds for stars of the anchor's spectral type and rotation, magnitudes in one band. It is photon noise alone: add the instrument's floor and the star's jitter with NOISESUM.";
