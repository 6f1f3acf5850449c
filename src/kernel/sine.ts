/** What the double nearest to pi lacks. */
const restOfPi = 1.2246467991473532e-16;

// Taylor's coefficients 1/3!, 1/5! ... 1/21!; at pi/2 the next term is 1e-18.
const s3 = 1 / 6;
const s5 = 1 / 120;
const s7 = 1 / 5040;
const s9 = 1 / 362880;
const s11 = 1 / 39916800;
const s13 = 1 / 6227020800;
const s15 = 1 / 1307674368000;
const s17 = 1 / 355687428096000;
const s19 = 1 / 121645100408832000;
const s21 = 1 / 51090942171709440000;

/**
 * Sine of an angle between 0 and pi by the basic arithmetic that IEEE 754 fixes to the last bit, so that it is the same
 * in every engine; engines differ in the last bit of theirs. Exactly 1 at the double nearest to pi/2.
 *
 *     sin x = sin(pi - x), whichever argument is at most pi/2; Taylor's series
 *
 * Given
 *   angle  [rad]  scalar, 0 < angle < pi
 * Returned  [1]; not defined outside the domain, which callers keep
 * Accuracy  relative error <= 3e-16; test/kernel/elementary.test.ts
 * Source    Taylor's series
 */
export function sine(angle: number): number {
  const x = angle <= Math.PI / 2 ? angle : Math.PI - angle + restOfPi;
  const z = x * x;
  const tail = s13 - z * (s15 - z * (s17 - z * (s19 - z * s21)));
  return x - x * z * (s3 - z * (s5 - z * (s7 - z * (s9 - z * (s11 - z * tail)))));
}
