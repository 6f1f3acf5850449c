import { isRepeating } from "../functions/argumentNames.js";
import type { Input } from "../functions/definition.js";
import type { Bound, Quantity } from "../functions/quantity.js";
import { kindPhrase } from "../units/kind.js";

/** What an input is and what it accepts: "orbital period; a duration above 0". */
export function describeInput(input: Input): string {
  switch (input.takes) {
    case "quantity": {
      const { quantity, fallbackText } = input;
      const needed = input.needed
        ? `, if ${input.needed.by.join(" and ")} ${input.needed.by.length > 1 ? "are" : "is"} 0`
        : "";
      const leftOut = fallbackText === undefined ? "" : `; left out: ${fallbackText}${needed}`;
      const more = isRepeating(input) ? "; as many as there are" : "";
      return `${quantity.meaning}; ${kindPhrase(quantity.kind)}${rangeText(quantity)}${leftOut}${more}`;
    }
    case "any quantity":
      return "a number with a unit of any kind";
    case "word":
      return `${input.words.map(({ word, meaning }) => `${word} (${meaning})`).join(", ")}${input.required ? "" : `; left out: ${input.words[0]!.word}`}`;
    case "count":
      return `${input.meaning}; a whole number from 1 to ${input.most}; left out: 1`;
    case "text":
      return input.meaning;
  }
}

/** " above 0 and below 1"; empty where every value is accepted. */
export function rangeText({ lower, upper }: Quantity): string {
  const parts = [lower && end(lower, "above", "at least"), upper && end(upper, "below", "at most")];
  const stated = parts.filter((part) => part !== undefined);
  return stated.length === 0 ? "" : ` ${stated.join(" and ")}`;
}

function end(bound: Bound, open: string, closed: string): string {
  return `${bound.open ? open : closed} ${bound.text}`;
}
