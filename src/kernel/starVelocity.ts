import { eccentricAnomaly } from "./eccentricAnomaly.js";

/**
 * Radial velocity of a star about its barycentre, away from the observer positive.
 *
 *     v = K (cos(nu + omega) + e cos omega), tan(nu / 2) = ((1 + e) / (1 - e))^(1/2) tan(E / 2), E - e sin E = M
 *
 * Given
 *   amplitude     any unit  scalar: K
 *   eccentricity  [1]       scalar, 0 <= e < 1
 *   argument      [rad]     scalar: argument of periastron of the star's orbit, omega
 *   meanAnomaly   [rad]     scalar, counted from periastron
 * Returned  in the unit of the amplitude
 * Accuracy  as sine and cosine of the engine: for figures; test/kernel/starVelocity.test.ts
 * Source    Lovis & Fischer 2010, in Exoplanets (ed. Seager), section 2
 */
export function starVelocity(amplitude: number, eccentricity: number, argument: number, meanAnomaly: number): number {
  const turn = 2 * Math.PI;
  const anomaly = eccentricAnomaly(meanAnomaly - turn * Math.floor(meanAnomaly / turn), eccentricity);
  const distance = 1 - eccentricity * Math.cos(anomaly);
  const cosine = (Math.cos(anomaly) - eccentricity) / distance;
  const sine = (Math.sqrt((1 - eccentricity) * (1 + eccentricity)) * Math.sin(anomaly)) / distance;
  const along = cosine * Math.cos(argument) - sine * Math.sin(argument);
  return amplitude * (along + eccentricity * Math.cos(argument));
}

/** The mean anomaly at which the planet passes in front of the star: true anomaly pi/2 - omega. */
export function conjunctionAnomaly(eccentricity: number, argument: number): number {
  const half = (Math.PI / 2 - argument) / 2;
  const ratio = Math.sqrt((1 - eccentricity) / (1 + eccentricity));
  const anomaly = 2 * Math.atan2(ratio * Math.sin(half), Math.cos(half));
  return anomaly - eccentricity * Math.sin(anomaly);
}
