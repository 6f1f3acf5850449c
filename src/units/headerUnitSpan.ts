import { readHeader, roundBrackets, squareBrackets } from "./readHeader.js";

/** Where a header states its unit: characters `from` up to `to`, without the brackets around it. */
export interface HeaderUnitSpan {
  readonly from: number;
  readonly to: number;
  /** The header is a unit as a whole, as in a row of units. */
  readonly whole: boolean;
}

/** The place of what `readHeader` takes for the unit, or for an attempt at one; undefined where the header has none. */
export function headerUnitSpan(text: string): HeaderUnitSpan | undefined {
  const { name, unit, problem } = readHeader(text);
  if (unit === undefined && problem === undefined) {
    return undefined;
  }
  const squared = squareBrackets.exec(text);
  if (squared && squared[1] !== "") return spanOf(squared);
  if (name === "") {
    const inside = squared ? squared[2]! : text;
    const from = text.indexOf(inside) + (inside.length - inside.trimStart().length);
    return { from, to: from + inside.trim().length, whole: true };
  }
  const rounded = roundBrackets.exec(text);
  return rounded ? spanOf(rounded) : undefined;
}

function spanOf(match: RegExpExecArray): HeaderUnitSpan {
  const from = match[1]!.length + 1;
  return { from, to: from + match[2]!.length, whole: false };
}
