const double = new Float64Array(1);
const words = new Int32Array(double.buffer);
/** Which of the two words of a double holds its exponent: 1 where the low word comes first in memory. */
const highWord = new Uint8Array(Uint32Array.of(1).buffer)[0];

/** 2^-3k and 2^k for every k a double can need, k = -341 at index 0; multiplying by them is exact. */
const [reductions, expansions] = powersOfTwo();

function powersOfTwo(): [Float64Array, Float64Array] {
  const middle = 341;
  const reduction = new Float64Array(2 * middle + 1).fill(1);
  const expansion = new Float64Array(2 * middle + 1).fill(1);
  for (let k = 1; k <= middle; k++) {
    reduction[middle + k] = reduction[middle + k - 1] / 8;
    reduction[middle - k] = reduction[middle - k + 1] * 8;
    expansion[middle + k] = expansion[middle + k - 1] * 2;
    expansion[middle - k] = expansion[middle - k + 1] / 2;
  }
  return [reduction, expansion];
}

/**
 * Cube root by the basic arithmetic that IEEE 754 fixes to the last bit, so that it is the same in every engine;
 * engines differ in the last bit of theirs.
 *
 *     x = m 2^(3k), 1 <= m < 8;  a cubic in m to 0.7 %, then twice Halley's step  t <- t (t^3 + 2 m) / (2 t^3 + m)
 *
 * The first step leaves 3e-7. Before the last, t is cut to 26 bits, so that its square is exact; what is added to it then
 * is so small that its rounding hardly counts.
 *
 * Given
 *   x  [any]  scalar, from 1e-300 to 1e300
 * Returned  [its cube root]; not defined outside the domain, which callers keep
 * Accuracy  within 0.7 units of the last place, relative error <= 1.5e-16; test/kernel/elementary.test.ts
 * Source    Halley's method, any numerical analysis text
 */
export function cubeRoot(x: number): number {
  double[0] = x;
  const index = ((words[highWord] >>> 20) / 3) | 0;
  const m = x * reductions[index];
  const seed = 0.69294 + m * (0.35198 + m * (m * 0.0020452 - 0.039831));
  const cube = seed * seed * seed;
  const root = (seed * (cube + 2 * m)) / (2 * cube + m);
  const scaled = root * 134217729;
  const t = scaled - (scaled - root);
  const quotient = m / (t * t);
  return expansions[index] * (t + (t * (quotient - t)) / (2 * t + quotient));
}
