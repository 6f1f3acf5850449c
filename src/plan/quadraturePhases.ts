import { cos, sin } from "../kernel/angle.js";
import { meanAnomalyAt, meanAnomalyAtTransit } from "../kernel/orbit/radialVelocity.js";

/**
 * Phases after the transit at which the velocity is at its lowest and at its highest.
 *
 * Given
 *   eccentricity  [1]    scalar, 0 <= e < 1
 *   omega         [rad]  scalar: of the star's orbit; any for a circle
 * Returned  [1], 0 <= phase < 1: 1/4 and 3/4 for a circle
 */
export function quadraturePhases(eccentricity: number, omega: number): readonly number[] {
  if (eccentricity === 0) return [0.25, 0.75];
  const transit = meanAnomalyAtTransit(eccentricity, omega);
  const low = meanAnomalyAt(sin(omega), -cos(omega), eccentricity);
  const high = meanAnomalyAt(-sin(omega), cos(omega), eccentricity);
  return [low, high].map((mean) => {
    const part = (mean - transit) / (2 * Math.PI);
    return part - Math.floor(part);
  });
}
