import { isProblem, type UnitProblem } from "./problem.js";
import { readUnit } from "./readUnit.js";
import type { Unit } from "./unit.js";

/** What a header cell says: the column's name and its unit; neither unit nor problem where it states no unit. */
export interface HeaderReading {
  readonly name: string;
  readonly unit: Unit | undefined;
  readonly problem: UnitProblem | undefined;
}

/** A header with its last square brackets: what is before them, in them and after them. */
export const squareBrackets = /^(.*)\[((?:[^[\]]|\[[^[\]]*\])*)\]([^[\]]*)$/s;
// A word, a space and a bracket, `K (m/s)`, is a name with its unit although it could be read as a product.
const namedBracket = /\s\(/;
/** The same of round brackets. */
export const roundBrackets = /^(.*)\(((?:[^()]|\([^()]*\))*)\)([^()]*)$/s;

/**
 * The unit of a header: its last square brackets, `Period [d]`; else the whole cell where it is a unit itself (a units
 * row); else its last round brackets where they hold a unit.
 */
export function readHeader(text: string): HeaderReading {
  const squared = squareBrackets.exec(text);
  if (squared && squared[1] !== "") {
    const unit = readUnit(squared[2]!);
    const name = nameAround(squared);
    return isProblem(unit) ? { name, unit: undefined, problem: unit } : { name, unit, problem: undefined };
  }
  const inside = squared ? squared[2]! : text;
  const whole = inside.trim() === "" ? undefined : readUnit(inside);
  const unit = whole && !isProblem(whole) ? whole : undefined;
  if (unit && !namedBracket.test(inside.trim())) return { name: "", unit, problem: undefined };
  const rounded = roundBrackets.exec(text);
  if (rounded && rounded[1] !== "" && rounded[2]!.trim() !== "") {
    const unit = readUnit(rounded[2]!);
    if (!isProblem(unit)) return { name: nameAround(rounded), unit, problem: undefined };
    if (unit.problem === "ambiguous unit") return { name: nameAround(rounded), unit: undefined, problem: unit };
  }
  return { name: unit ? "" : text.trim(), unit, problem: undefined };
}

function nameAround(match: RegExpExecArray): string {
  return `${match[1]!.trim()} ${match[3]!.trim()}`.trim();
}
