import type { Quantity } from "../functions/quantity.js";
import type { CallProblem } from "./callProblem.js";

/** The values strictly between `lower` and `upper` are those of a quantity's range. */
export interface OpenRange {
  readonly lower: number;
  readonly upper: number;
}

/** A quantity's range as an open interval of doubles, so that one comparison at each end decides. */
export function openRange(quantity: Quantity): OpenRange {
  const { lower, upper } = quantity;
  return {
    lower: !lower ? Number.NEGATIVE_INFINITY : lower.open ? lower.at : neighbour(lower.at, -1),
    upper: !upper ? Number.POSITIVE_INFINITY : upper.open ? upper.at : neighbour(upper.at, 1),
  };
}

export function isWithin(range: OpenRange, value: number): boolean {
  return value > range.lower && value < range.upper;
}

/** What is wrong with a base-unit value outside a quantity's range; `text` is the value as it was given. */
export function rangeProblem(input: string, quantity: Quantity, base: number, text: string): CallProblem {
  const { lower, upper } = quantity;
  if (lower?.open && lower.at === 0 && base === 0) return { about: "zero or blank", input, bound: lower };
  if (lower && (lower.open ? base <= lower.at : base < lower.at)) {
    return { about: "bound", input, value: text, bound: lower, side: "lower" };
  }
  if (upper && (upper.open ? base >= upper.at : base > upper.at)) {
    return { about: "bound", input, value: text, bound: upper, side: "upper" };
  }
  return { about: "beyond numbers", input, value: text };
}

/** The next double on one side. */
function neighbour(value: number, direction: 1 | -1): number {
  if (value === 0) return direction * Number.MIN_VALUE;
  const view = new DataView(new ArrayBuffer(8));
  view.setFloat64(0, value);
  const away = value > 0 === direction > 0;
  view.setBigInt64(0, view.getBigInt64(0) + (away ? 1n : -1n));
  return view.getFloat64(0);
}
