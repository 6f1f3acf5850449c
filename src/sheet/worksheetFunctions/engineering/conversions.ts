import { define } from "../define/define.js";
import { number, text } from "../define/parameters.js";
import { fromLibrary } from "../library/fromLibrary.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

/** Degrees of each scale to a kelvin, and the temperature 273.15 K on it. */
const scales: Readonly<Record<string, readonly [number, number]>> = {
  K: [1, 273.15],
  kel: [1, 273.15],
  C: [1, 0],
  cel: [1, 0],
  F: [1.8, 32],
  fah: [1.8, 32],
  Rank: [1.8, 491.67],
  Reau: [0.8, 0],
};

const byRatio = fromLibrary("CONVERT", [number("number"), text("unit"), text("other unit")] as const);

/** Section 6.16.18; temperatures have a zero point besides a ratio. */
export const conversions: readonly WorksheetFunction[] = [
  define("CONVERT", [number("number"), text("unit"), text("other unit")] as const, (value, from, to) => {
    const [source, target] = [scales[from], scales[to]];
    if (!source || !target) {
      return byRatio.call([value, from, to]);
    }
    return from === to ? value : ((value - source[1]) / source[0]) * target[0] + target[1];
  }),
];
