import type { RandomNumbers } from "./randomNumbers.js";

/**
 * Standard normal numbers by the polar method, two from each accepted point of the unit disc.
 *
 * Source: Marsaglia & Bray 1964, SIAM Review 6, 260
 */
export function normalNumbers(random: RandomNumbers): () => number {
  let kept: number | undefined;
  return () => {
    if (kept !== undefined) {
      const last = kept;
      kept = undefined;
      return last;
    }
    for (;;) {
      const x = 2 * random() - 1;
      const y = 2 * random() - 1;
      const square = x * x + y * y;
      if (square > 0 && square < 1) {
        const scale = Math.sqrt((-2 * Math.log(square)) / square);
        kept = y * scale;
        return x * scale;
      }
    }
  };
}

/**
 * A number of the split normal distribution about a mode: one half of a normal distribution on each side, each with its
 * own width, joined without a step, so that the wider side is the likelier one. Equal widths make it normal.
 *
 * Mean: mode + (2/pi)^(1/2) (upper - lower); variance: (1 - 2/pi) (upper - lower)^2 + upper lower.
 * Source: Wallis 2014, Statistical Science 29, 106 (the distribution is Fechner's, 1897)
 */
export function splitNormal(
  random: RandomNumbers,
  normal: () => number,
  mode: number,
  upper: number,
  lower: number,
): number {
  const deviate = normal();
  if (upper === lower) return mode + upper * deviate;
  const isAbove = random() * (upper + lower) < upper;
  return isAbove ? mode + upper * Math.abs(deviate) : mode - lower * Math.abs(deviate);
}
