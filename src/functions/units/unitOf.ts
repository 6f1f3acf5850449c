import { isProblem } from "../../units/problem.js";
import { readHeader } from "../../units/readHeader.js";
import { readQuantity } from "../../units/readQuantity.js";
import { readUnit } from "../../units/readUnit.js";
import type { LookupAnswer, LookupDefinition } from "../definition.js";

export const unitOf: LookupDefinition = {
  form: "lookup",
  name: "UNITOF",
  question: "Which unit was understood here?",
  inputs: [{ takes: "text", name: "text", meaning: "a header, a unit or a quantity text" }],
  takesResult: false,
  answer: unitIn,
  formula: "the unit in VOUnits spelling; 1 for a plain number",
  source: "IVOA VOUnits 1.1",
  examples: [
    {
      cells: ["Semi-amplitude [km s-1]"],
      gives: "km/s",
      because: "IVOA VOUnits 1.1, section 2.4: one division, no spaces",
    },
  ],
};

function unitIn(text: string): LookupAnswer {
  const header = readHeader(text);
  if (header.problem) return { problem: "unit", unit: header.problem };
  if (header.unit) return { text: header.unit.text };
  const bare = readUnit(text);
  if (isProblem(bare) && bare.problem === "ambiguous unit") return { problem: "unit", unit: bare };
  const quantity = readQuantity(text);
  if (!isProblem(quantity)) return quantity.unit ? { text: quantity.unit.text } : { problem: "no unit stated", text };
  if (quantity.problem !== "not a number") return { problem: "unit", unit: quantity };
  const slip =
    isProblem(bare) && (bare.problem === "unit grammar" || (bare.problem === "unknown unit" && bare.nearest));
  return slip ? { problem: "unit", unit: bare } : { problem: "no unit stated", text };
}
