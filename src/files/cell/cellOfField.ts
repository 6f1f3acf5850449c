import { unguardFormula } from "./guardFormula.js";
import { readNumber } from "./readNumber.js";

/**
 * What a field of a text file means as a cell. Blank fields, quoted or not, are blank cells; a number is a number only
 * if nothing of it is lost (see readNumber); exactly TRUE or FALSE is a truth value; all else is text, as it stood but for
 * the apostrophe that keeps a text from being a formula.
 */
export function cellOfField(field: string): number | string | boolean | null {
  const number = readNumber(field);
  if (number !== undefined) {
    return number;
  }
  if (field === "TRUE" || field === "FALSE") {
    return field === "TRUE";
  }
  const trimmed = field.trim();
  if (trimmed === "") {
    return null;
  }
  return (trimmed.length < field.length ? readNumber(trimmed) : undefined) ?? unguardFormula(field);
}
