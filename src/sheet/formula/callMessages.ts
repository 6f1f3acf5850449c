import { nearest } from "../../units/nearest.js";
import { worksheetFunctionNames } from "../worksheetFunctions/findWorksheetFunction.js";
import type { Functions } from "./functions.js";

/** The sentence for a function that nobody knows, with the nearest name that somebody does. */
export function unknownFunction(name: string, functions: Functions): string {
  const own = functions.cellFunctionNames();
  // Most often it is one of the host's functions without the namespace that it stands in.
  const near = own.find((full) => full.endsWith(`.${name}`)) ?? nearest(name, [...own, ...worksheetFunctionNames]);
  return near === undefined
    ? `${name}: no function has this name; check the spelling, for example SUM or AVERAGE`
    : `${name}: no function has this name; did you mean ${near}?`;
}

/** "1 argument", "2 arguments". */
export function count(parameters: number): string {
  return parameters === 1 ? "1 argument" : `${parameters} arguments`;
}

/** "1 argument is", "2 to 3 are". */
export function argumentCount(least: number, most: number): string {
  if (least === most) {
    return `${count(least)} ${least === 1 ? "is" : "are"}`;
  }
  return Number.isFinite(most) ? `${least} to ${most} are` : `${least} or more are`;
}
