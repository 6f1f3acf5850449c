import type { NumberFormat } from "../../sheet/display/numberFormat.js";
import { anObject, member, oneOf, type Part, wholeNumber } from "./expectation.js";

const most = 30;

/** How a number is shown, from the plain data of a file. */
export function readFormat(part: Part): NumberFormat {
  const format = anObject(part);
  const count = (name: string, least: number) => wholeNumber(member(format, name), least, most);
  const uncertainty = () => oneOf(member(format, "digits"), [1, 2, 3, 4, "PDG"] as const);
  const kind = oneOf(member(format, "kind"), Object.keys(kinds) as NumberFormat["kind"][]);
  switch (kind) {
    case "general":
    case "date":
      return { kind };
    case "fixed":
      return { kind, decimals: count("decimals", 0), grouped: oneOf(member(format, "grouped"), [true, false]) };
    case "significant":
    case "scientific":
      return { kind, digits: count("digits", 1) };
    case "percent":
    case "time":
    case "date-time":
      return { kind, decimals: count("decimals", 0) };
    case "plus-minus":
    case "brackets":
      return { kind, digits: uncertainty() };
  }
}

const kinds: Readonly<Record<NumberFormat["kind"], true>> = {
  general: true,
  fixed: true,
  significant: true,
  scientific: true,
  percent: true,
  date: true,
  time: true,
  "date-time": true,
  "plus-minus": true,
  brackets: true,
};
