import { type Compute, neededBy, optional } from "../definition.js";
import * as quantity from "../quantities.js";

export const orbitEccentricity = optional(quantity.eccentricity, 0, "a circular orbit");

/** A circle has no periastron; by custom it is then put at the transit. */
export const omegaOfStar = neededBy(
  ["eccentricity"],
  "an eccentric orbit needs the star's omega (the planet's differs by 180 deg)",
  quantity.omega,
  Math.PI / 2,
  "90 deg",
);

/** The same scale in every row. */
export function steady(scale: number): Compute {
  return (rows, out) => {
    out.fill(scale, 0, rows);
  };
}
