import { type NumberDefinition, optional, type QuantityInput, required } from "../functions/definition.js";
import * as quantity from "../functions/quantities.js";

/** What a plan reads from the columns of a table. */
export const planInputs = {
  rightAscension: required(quantity.rightAscension),
  declination: required(quantity.declination),
  period: required(quantity.period),
  referenceTime: required(quantity.referenceTime),
  visits: required(quantity.visits),
  exposure: required(quantity.exposure),
  overhead: optional(quantity.overhead, 0, "none"),
  hours: required(quantity.telescopeTime),
  eccentricity: optional(quantity.eccentricity, 0, "a circular orbit"),
  omega: optional(quantity.omega, Number.NaN, "needed for an eccentric orbit"),
} as const satisfies Readonly<Record<string, QuantityInput>>;

export type PlanInput = keyof typeof planInputs;

/** The same as a function's inputs are described, so that what is wrong with a cell is said in the same words. */
export const planDefinition: NumberDefinition = {
  form: "number",
  name: "PLAN",
  question: "Which targets, and when?",
  inputs: Object.values(planInputs),
  result: { quantity: quantity.telescopeTime, unit: "h" },
  compute: (rows, out) => out.fill(Number.NaN, 0, rows),
  formula: "",
  source: "",
  examples: [{ cells: [], gives: "", because: "" }],
};
