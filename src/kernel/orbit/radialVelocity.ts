import { atan2, cos, sin } from "../angle.js";
import { isEccentricity, isMagnitudeOrZero, isVelocity } from "../domain.js";
import { periodsBetween } from "../time/phase.js";
import { solveKepler } from "./eccentricAnomaly.js";

/** What took place at the reference time, as the number code the kernels take. */
export const transit = 0;
export const periastron = 1;

const turn = 2 * Math.PI;

/**
 * Mean anomaly [rad] at a true anomaly, given by its sine and cosine.
 *
 *     E = atan2((1 - e^2)^(1/2) sin nu, e + cos nu);  M = E - e sin E
 */
export function meanAnomalyAt(sine: number, cosine: number, eccentricity: number): number {
  const e = eccentricity;
  const y = Math.sqrt((1 - e) * (1 + e)) * sine;
  return atan2(y, e + cosine) - (e * y) / (1 + e * cosine);
}

/** An orbit as it lies: rows below each other mostly share one. */
const orbit = { omega: Number.NaN, eccentricity: Number.NaN, sine: Number.NaN, cosine: Number.NaN, mean: Number.NaN };

function orbitOf(eccentricity: number, omega: number): typeof orbit {
  if (omega !== orbit.omega || eccentricity !== orbit.eccentricity) {
    orbit.omega = omega;
    orbit.eccentricity = eccentricity;
    orbit.sine = sin(omega);
    orbit.cosine = cos(omega);
    orbit.mean = meanAnomalyAt(orbit.cosine, orbit.sine, eccentricity);
  }
  return orbit;
}

/** Mean anomaly at transit, where nu + omega = 90 deg. */
export function meanAnomalyAtTransit(eccentricity: number, omega: number): number {
  return orbitOf(eccentricity, omega).mean;
}

const place = new Float64Array(3);

/**
 * Radial velocity of a star that one planet moves.
 *
 *     V = gamma + K (cos(nu + omega) + e cos omega)
 *
 * Given
 *   time          [d from J2000.0]  scalar
 *   period        [s]               scalar, > 0
 *   amplitude     [m/s]             scalar, >= 0
 *   reference     [d from J2000.0]  scalar, in the scale of the time
 *   eccentricity  [1]               scalar, 0 <= e < 1
 *   omega         [rad]             scalar: of the star's orbit, from the ascending node, where the star recedes fastest
 *   systemic      [m/s]             scalar
 *   event                           scalar, what the reference time is that of: 0 transit (nu + omega = 90 deg), 1 periastron
 * Returned  [m/s], receding positive; NaN outside the domain (see domain.ts)
 * Accuracy  error <= 4e-15 K besides that of the instants, times dnu/dM; test/kernel/radialVelocity.test.ts
 * Source    Lovis & Fischer 2010, in Exoplanets (ed. Seager); Wright & Howard 2009, ApJS 182, 205
 */
export function radialVelocity(
  time: number,
  period: number,
  amplitude: number,
  reference: number,
  eccentricity: number,
  omega: number,
  systemic: number,
  event: number,
): number {
  if (!(isMagnitudeOrZero(amplitude) && isEccentricity(eccentricity) && Math.abs(omega) <= 100)) return Number.NaN;
  if (!(isVelocity(systemic) && (event === transit || event === periastron))) return Number.NaN;
  const { sine, cosine, mean } = orbitOf(eccentricity, omega);
  const periods = periodsBetween(time, period, reference);
  const part = periods - Math.round(periods) + (event === transit ? mean / turn : 0);
  solveKepler((part - Math.round(part)) * turn, eccentricity, place);
  const rise = place[2]!;
  // Of the planet's distance 1 - e cos E: cos nu = (cos E - e) / r, sin nu = (1 - e^2)^(1/2) sin E / r.
  const along = 1 - eccentricity - rise;
  const across = Math.sqrt((1 - eccentricity) * (1 + eccentricity)) * place[1]!;
  const distance = 1 - eccentricity + eccentricity * rise;
  return systemic + amplitude * ((along * cosine - across * sine) / distance + eccentricity * cosine);
}

/** `radialVelocity` of the first `rows` entries, to the same bits. */
export function radialVelocities(
  rows: number,
  out: Float64Array,
  time: Float64Array,
  period: Float64Array,
  amplitude: Float64Array,
  reference: Float64Array,
  eccentricity: Float64Array,
  omega: Float64Array,
  systemic: Float64Array,
  event: Float64Array,
): void {
  for (let row = 0; row < rows; row++) {
    out[row] = radialVelocity(
      time[row]!,
      period[row]!,
      amplitude[row]!,
      reference[row]!,
      eccentricity[row]!,
      omega[row]!,
      systemic[row]!,
      event[row]!,
    );
  }
}
