import { cubeRoot } from "./cubeRoot.js";

/**
 * Speed in a two-body circular motion, per unit mass of the *other* body: each body moves about the barycentre with
 * the other's GM times this.
 *
 *     w = (2 pi / (P GM_total^2))^(1/3)
 *
 * Given
 *   period     [s]       scalar, > 0
 *   totalMass  [m3 s-2]  scalar, > 0: GM of both bodies
 * Returned  [m-2 s]; callers check the domain
 * Accuracy  relative error <= 1e-15, within the bound of every kernel that calls it
 * Source    Kepler's third law and the balance of momenta
 */
export function speedPerMass(period: number, totalMass: number): number {
  return cubeRoot((2 * Math.PI) / (period * totalMass * totalMass));
}
