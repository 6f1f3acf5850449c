/** Powers that a double holds exactly. */
const exact = Float64Array.from({ length: 23 }, (_, power) => Number(`1e${power}`));

/** 1/20!, 1/19! ... 1/1!, 1: Taylor's coefficients of the exponential; at 1.16 the next term is 4e-19. */
const coefficients = Float64Array.from({ length: 21 }, (_, index) => {
  let factorial = 1;
  for (let factor = 2; factor <= 20 - index; factor++) factorial *= factor;
  return 1 / factorial;
});

/**
 * 10^x by the basic arithmetic that IEEE 754 fixes to the last bit, so that it is the same in every engine.
 *
 *     10^x = 10^n e^((x - n) ln 10),  n the whole number nearest to x;  Taylor's series
 *
 * Given
 *   x  [1]  scalar, from -100 to 100
 * Returned  [1]; not defined outside the domain, which callers keep
 * Accuracy  relative error <= 2e-15; test/kernel/plan.test.ts
 * Source    Taylor's series
 */
export function powerOfTen(x: number): number {
  const whole = Math.round(x);
  const rest = (x - whole) * Math.LN10;
  let sum = coefficients[0];
  for (let index = 1; index < coefficients.length; index++) sum = sum * rest + coefficients[index];
  for (let left = Math.abs(whole); left > 0; left -= 22) {
    const power = exact[Math.min(left, 22)];
    sum = whole > 0 ? sum * power : sum / power;
  }
  return sum;
}
