import { isEccentricity } from "./domain.js";
import { sine } from "./sine.js";

/**
 * What one visit contributes to the semi-amplitude: sigma_K^2 = sigma^2 / (N H), the orbit's shape and times known.
 *
 *     uniform     H = s^2 (sin^2 omega + s cos^2 omega) / (1 + s),  s = (1 - e^2)^(1/2): the variance of the curve over time
 *     quadrature  H = 1: half of the visits at each extreme of the velocity, which differ by 2 K whatever e is
 *
 * Given
 *   sampling      [1]    scalar: 0 uniform in time, 1 at the quadratures
 *   eccentricity  [1]    scalar, 0 <= e < 1
 *   omega         [rad]  scalar, of the star's orbit; any, also NaN, for a circle and at the quadratures
 * Returned  [1], 1/2 for a circle sampled uniformly; NaN outside the domain
 * Accuracy  relative error <= 4e-15; test/kernel/plan.test.ts
 * Source    inverse Fisher matrix of semi-amplitude and systemic velocity (any statistics text), averaged over one period
 */
export function samplingPower(sampling: number, eccentricity: number, omega: number): number {
  if (!isEccentricity(eccentricity)) return Number.NaN;
  if (sampling === 1) return 1;
  if (sampling !== 0) return Number.NaN;
  if (eccentricity === 0) return 0.5;
  if (!(Math.abs(omega) <= 1000)) return Number.NaN;
  const square = (1 - eccentricity) * (1 + eccentricity);
  const s = Math.sqrt(square);
  const folded = omega - Math.PI * Math.floor(omega / Math.PI);
  const sin = folded > 0 && folded < Math.PI ? sine(folded) : 0;
  return (square * (sin * sin + s * (1 - sin) * (1 + sin))) / (1 + s);
}
