import { isMagnitude } from "./domain.js";

/**
 * Mass of star and planet together, from the size and period of their orbit.
 *
 *     GM_total = a (2 pi a / P)^2
 *
 * Given
 *   axis    [m]  scalar, > 0: semi-major axis of the relative orbit
 *   period  [s]  scalar, > 0
 * Returned  [m3 s-2] GM; NaN outside the domain (see domain.ts)
 * Accuracy  relative error <= 4e-15; test/kernel/reference.test.ts
 * Source    Kepler's third law in Newton's form; Murray & Correia 2010, in Exoplanets (ed. Seager)
 */
export function totalMass(axis: number, period: number): number {
  if (!(isMagnitude(axis) && isMagnitude(period))) return Number.NaN;
  const speed = (2 * Math.PI * axis) / period;
  return axis * speed * speed;
}

/** `totalMass` of the first `rows` entries, to the same bits. */
export function totalMasses(rows: number, out: Float64Array, axis: Float64Array, period: Float64Array): void {
  for (let row = 0; row < rows; row++) out[row] = totalMass(axis[row], period[row]);
}
