import { quantityText } from "../../units/quantityText.js";
import type { TextDefinition } from "../definition.js";

export const tag: TextDefinition = {
  form: "text",
  name: "TAG",
  question: "How do I make a number carry its unit?",
  inputs: [{ takes: "any quantity", name: "value" }],
  compose: quantityText,
  formula: "the number, its uncertainty and the VOUnits spelling of its unit, as text that every function reads back",
  source: "IVOA VOUnits 1.1",
  examples: [
    {
      cells: ["4.2308(2) days"],
      gives: "4.2308 \u00b1 0.0002 d",
      because: "the digits in brackets are those of the last places (common practice)",
    },
  ],
};
