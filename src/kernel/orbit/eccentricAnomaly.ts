import { cubeRoot } from "../cubeRoot.js";
import { isEccentricity } from "../domain.js";

const piSquared = Math.PI * Math.PI;
const first = (3 * piSquared) / (piSquared - 6);
const second = (1.6 * Math.PI) / (piSquared - 6);
const twelfth = 1 / 12;
const twentieth = 1 / 20;

/**
 * Eccentric anomaly: the root of Kepler's equation.
 *
 *     E - e sin E = M
 *
 * A cubic in E whose coefficients match the equation at both ends starts within 1e-3 of the root. There the equation is
 * taken in the form (1 - e) E + e (E - sin E) = M, with E - sin E by its own series, so that nothing cancels, and solved
 * by a fixed number of steps.
 *
 * Given
 *   meanAnomaly   [rad]  scalar, |M| <= pi, whole turns taken off by the caller
 *   eccentricity  [1]    scalar, 0 <= e < 1
 * Returned  [rad] of the sign of M; NaN outside the domain
 * Accuracy  as if M were wrong by at most 4 units of its last place, and E by one of its own, at any e < 1 and down to
 *           M = 1e-300; test/kernel/kepler.test.ts
 * Source    Markley 1995, CeMDA 63, 101, for the cubic (from memory; the test decides); Danby 1988, Fundamentals of
 *           Celestial Mechanics, for the step
 */
export function eccentricAnomaly(meanAnomaly: number, eccentricity: number): number {
  solveKepler(meanAnomaly, eccentricity, place);
  return place[0]!;
}

const place = new Float64Array(3);

/**
 * `eccentricAnomaly` with what follows from it on the way.
 *
 * Returned  out = E [rad], sin E, 1 - cos E, these two to the rounding of E; all NaN outside the domain
 */
export function solveKepler(meanAnomaly: number, eccentricity: number, out: Float64Array): void {
  const m = Math.abs(meanAnomaly);
  if (!(m <= Math.PI && isEccentricity(eccentricity))) {
    out[0] = out[1] = out[2] = Number.NaN;
    return;
  }
  if (m === 0) {
    out[0] = meanAnomaly;
    out[1] = out[2] = 0;
    return;
  }
  polish(eccentricity === 0 ? m : cubicStart(m, eccentricity), m, eccentricity, out);
  if (meanAnomaly >= 0) return;
  out[0] = -out[0]!;
  out[1] = -out[1]!;
}

function cubicStart(m: number, e: number): number {
  const alpha = first + (second * (Math.PI - m)) / (1 + e);
  const d = 3 * (1 - e) + alpha * e;
  const q = 2 * alpha * d * (1 - e) - m * m;
  const r = (3 * alpha * d * (d - 1 + e) + m * m) * m;
  const root = cubeRoot(r + Math.sqrt(q * q * q + r * r));
  const w = root * root;
  const sum = w * w + w * q + q * q;
  return (2 * r * w + m * sum) / (d * sum);
}

// 1/3!, 1/5! ... 1/27! and 1/2!, 1/4! ... 1/26!.
const l3 = 1 / 6;
const l5 = 1 / 120;
const l7 = 1 / 5040;
const l9 = 1 / 362880;
const l11 = 1 / 39916800;
const l13 = 1 / 6227020800;
const l15 = 1 / 1307674368000;
const l17 = 1 / 355687428096000;
const l19 = 1 / 121645100408832000;
const l21 = 1 / 51090942171709440000;
const l23 = 1 / 2.585201673888498e22;
const l25 = 1 / 1.5511210043330986e25;
const l27 = 1 / 1.0888869450418352e28;

const v2 = 1 / 2;
const v4 = 1 / 24;
const v6 = 1 / 720;
const v8 = 1 / 40320;
const v10 = 1 / 3628800;
const v12 = 1 / 479001600;
const v14 = 1 / 87178291200;
const v16 = 1 / 20922789888000;
const v18 = 1 / 6402373705728000;
const v20 = 1 / 2432902008176640000;
const v22 = 1 / 1.1240007277776077e21;
const v24 = 1 / 6.204484017332394e23;
const v26 = 1 / 4.0329146112660565e26;

/** The root near `start`: the equation and its derivatives are taken there once, the rest is their Taylor series. */
function polish(start: number, m: number, e: number, out: Float64Array): void {
  const z = start * start;
  const y = z * z;
  // E - sin E and 1 - cos E; even and odd powers apart, so that a processor works on four sums at once.
  const lagEven = l3 + y * (l7 + y * (l11 + y * (l15 + y * (l19 + y * (l23 + y * l27)))));
  const lagOdd = l5 + y * (l9 + y * (l13 + y * (l17 + y * (l21 + y * l25))));
  const riseEven = v2 + y * (v6 + y * (v10 + y * (v14 + y * (v18 + y * (v22 + y * v26)))));
  const riseOdd = v4 + y * (v8 + y * (v12 + y * (v16 + y * (v20 + y * v24))));
  const lag = start * z * (lagEven - z * lagOdd);
  const rise = z * (riseEven - z * riseOdd);
  const f = (1 - e) * start + e * lag - m;
  const f1 = 1 - e + e * rise;
  const f2 = (e * (start - lag)) / 2;
  const f3 = e * (1 - rise) * l3;
  // Halley's step leaves a part in a billion; Newton's on the Taylor series the square of that.
  const x = (-f * f1) / (f1 * f1 - f * f2);
  const f4 = -f2 * twelfth;
  const f5 = -f3 * twentieth;
  const value = f + x * (f1 + x * (f2 + x * (f3 + x * (f4 + x * f5))));
  const slope = f1 + x * (2 * f2 + x * (3 * f3 + x * (4 * f4 + x * 5 * f5)));
  const d = x - value / slope;
  const d2 = d * d;
  // Sine and 1 - cosine of start + d; d is small, a hundredth at most.
  const sineOfD = d * (1 - d2 * (l3 - d2 * (l5 - d2 * l7)));
  const riseOfD = d2 * (v2 - d2 * (v4 - d2 * v6));
  const sine = start - lag;
  out[0] = start + d;
  out[1] = sine + (sineOfD * (1 - rise) - sine * riseOfD);
  out[2] = rise + (riseOfD * (1 - rise) + sine * sineOfD);
}

/** `eccentricAnomaly` of the first `rows` entries, to the same bits. */
export function eccentricAnomalies(
  rows: number,
  out: Float64Array,
  meanAnomaly: Float64Array,
  eccentricity: Float64Array,
): void {
  for (let row = 0; row < rows; row++) out[row] = eccentricAnomaly(meanAnomaly[row]!, eccentricity[row]!);
}
