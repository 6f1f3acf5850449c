import { constants } from "../../kernel/constants.js";
import { nearest } from "../../units/nearest.js";
import type { LookupAnswer, LookupDefinition } from "../definition.js";

const byName = new Map(constants.map((constant) => [constant.name, constant]));

export const constant: LookupDefinition = {
  form: "lookup",
  name: "CONSTANT",
  question: "What is this constant of the standards, in the unit I need?",
  inputs: [{ takes: "text", name: "name", meaning: `one of ${[...byName.keys()].join(", ")}` }],
  takesResult: true,
  answer,
  formula: "the value of the constant; in SI units unless a result header asks for another",
  source: "SI (2019), CODATA 2022, IAU 2012 Resolution B2, IAU 2015 Resolutions B2 and B3",
  examples: [
    { cells: ["c"], result: "km/s", gives: "299792.458 km/s", because: "SI (2019), exact" },
    { cells: ["au"], gives: "149597870700 m", because: "IAU 2012 Resolution B2, exact" },
  ],
};

function answer(text: string): LookupAnswer {
  const found = byName.get(text.trim());
  if (found) return { value: found.value, unit: found.unit };
  return { problem: "unknown name", text, nearest: nearest(text.trim(), byName.keys()) };
}
