import type { Cell, CellError } from "../../../call/cell.js";
import { outside } from "../define/outside.js";
import type { Tails } from "../numerics/quantile.js";

/** A condition that a parameter of a distribution has to meet. */
export interface Condition {
  readonly holds: boolean;
  readonly input: string;
  readonly value: Cell;
  readonly because: string;
  readonly needed: string;
}

export const positive = (input: string, value: number): Condition => ({
  holds: value > 0,
  input,
  value,
  because: "not above 0",
  needed: "a number above 0 is needed, for example 2",
});

export const notNegative = (input: string, value: number): Condition => ({
  holds: value >= 0,
  input,
  value,
  because: "below 0",
  needed: "a number of 0 or more is needed, for example 2",
});

export const atLeast = (input: string, value: number, least: number): Condition => ({
  holds: value >= least,
  input,
  value,
  because: `below ${least}`,
  needed: `a number of ${least} or more is needed`,
});

/** A chance that may be 0 and 1. */
export const chance = (input: string, value: number): Condition => ({
  holds: value >= 0 && value <= 1,
  input,
  value,
  because: "outside 0 to 1",
  needed: "a chance from 0 to 1 is needed, for example 0.95",
});

/** A chance at whose ends the value would be infinite. */
export const openChance = (value: number, input = "probability"): Condition => ({
  holds: value > 0 && value < 1,
  input,
  value,
  because: "not between 0 and 1",
  needed: "a probability between 0 and 1 is needed, for example 0.95",
});

export const upTo = (input: string, value: number, most: number): Condition => ({
  holds: value <= most,
  input,
  value,
  because: `above ${most}`,
  needed: `a number up to ${most} is needed`,
});

/** The error of the first condition that is not met. */
export function firstProblem(name: string, conditions: readonly Condition[]): CellError | undefined {
  const broken = conditions.find((each) => !each.holds);
  return broken && outside(`${name}: ${broken.input}`, broken.value, broken.because, broken.needed);
}

export const belowChance = (p: number): Tails => ({ below: p, above: 1 - p });
export const aboveChance = (p: number): Tails => ({ below: 1 - p, above: p });

/** The value where all conditions are met, else the error of the first that is not. */
export const guarded = (name: string, conditions: readonly Condition[], compute: () => number): Cell =>
  firstProblem(name, conditions) ?? compute();

export const freedomOf = (freedom: number, input = "degrees of freedom") => atLeast(input, freedom, 1);
