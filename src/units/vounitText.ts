import { findUnitSymbol } from "./findUnitSymbol.js";
import { isProblem } from "./problem.js";
import { one, type Unit } from "./unit.js";

const listed = "IVOA VOUnits 1.1";
const functions = new Set(["log", "ln", "exp", "sqrt"]);

/**
 * A unit as IVOA VOUnits 1.1 asks for it: symbols that it does not list stand in single quotes, `'jupiterMass'`, so
 * that no reader takes their first letter for a prefix; a plain number is the empty text.
 */
export function vounitText(unit: Unit): string {
  if (unit.text === one.text) return "";
  return unit.text.replace(/[A-Za-z_]+(?![A-Za-z_]*\()/g, (word) => {
    const found = findUnitSymbol(word);
    if (functions.has(word) || isExponent(word)) return word;
    return !isProblem(found) && found.row.source === listed ? word : `'${word}'`;
  });
}

/** The letter of a scale such as 1.8E27. */
function isExponent(word: string): boolean {
  return word === "E" || word === "e";
}
