/** Uniform numbers in [0, 1), the same for the same seed on every machine. */
export type RandomNumbers = () => number;

/**
 * xoshiro128**: 32 random bits a step, period 2^128 - 1; two steps make the 53 bits of a double. The state is seeded by
 * splitmix64, so that neighbouring seeds give unrelated numbers.
 *
 * Sources: Blackman & Vigna 2021, ACM Trans. Math. Softw. 47, 36 (xoshiro); Steele, Lea & Flood 2014, OOPSLA, 453
 * (splitmix64).
 */
export function randomNumbers(seed: number): RandomNumbers {
  const next = xoshiro128(seedState(seed));
  return () => ((next() >>> 5) * 2 ** 26 + (next() >>> 6)) * 2 ** -53;
}

export type State128 = readonly [number, number, number, number];

/** The generator itself, from a state that is not all zero. */
export function xoshiro128([a, b, c, d]: State128): () => number {
  let [s0, s1, s2, s3] = [a | 0, b | 0, c | 0, d | 0];
  return () => {
    const result = Math.imul(rotated(Math.imul(s1, 5), 7), 9) >>> 0;
    const shifted = s1 << 9;
    s2 ^= s0;
    s3 ^= s1;
    s1 ^= s2;
    s0 ^= s3;
    s2 ^= shifted;
    s3 = rotated(s3, 11);
    return result;
  };
}

function rotated(bits: number, by: number): number {
  return (bits << by) | (bits >>> (32 - by));
}

const mask = (1n << 64n) - 1n;

/** The first two numbers of splitmix64, cut into four words. */
export function seedState(seed: number): State128 {
  let state = BigInt(Math.trunc(seed)) & mask;
  const words: number[] = [];
  for (let turn = 0; turn < 2; turn++) {
    state = (state + 0x9e3779b97f4a7c15n) & mask;
    let mixed = state;
    mixed = ((mixed ^ (mixed >> 30n)) * 0xbf58476d1ce4e5b9n) & mask;
    mixed = ((mixed ^ (mixed >> 27n)) * 0x94d049bb133111ebn) & mask;
    mixed ^= mixed >> 31n;
    words.push(Number(mixed & 0xffffffffn), Number(mixed >> 32n));
  }
  return words as unknown as State128;
}
