const mostSteps = 60;

/**
 * Eccentric anomaly from the mean anomaly: Kepler's equation.
 *
 *     E - e sin E = M, by Newton's steps kept within bounds that halve where a step would leave them
 *
 * Given
 *   meanAnomaly   [rad]  scalar, 0 <= M <= 2 pi
 *   eccentricity  [1]    scalar, 0 <= e < 1
 * Returned  [rad] between 0 and 2 pi
 * Accuracy  the equation holds to 4e-15 rad up to e = 0.999; test/kernel/starVelocity.test.ts
 * Source    Murray & Correia 2010, in Exoplanets (ed. Seager), eq. 33 (number from memory)
 */
export function eccentricAnomaly(meanAnomaly: number, eccentricity: number): number {
  let [low, high] = [0, 2 * Math.PI];
  let anomaly = meanAnomaly;
  for (let step = 0; step < mostSteps; step++) {
    const excess = anomaly - eccentricity * Math.sin(anomaly) - meanAnomaly;
    if (excess > 0) high = anomaly;
    else low = anomaly;
    const newton = anomaly - excess / (1 - eccentricity * Math.cos(anomaly));
    const next = newton > low && newton < high ? newton : (low + high) / 2;
    if (next === anomaly || Math.abs(excess) < 1e-16) break;
    anomaly = next;
  }
  return anomaly;
}
