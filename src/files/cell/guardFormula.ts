/** How a worksheet program may tell a formula from a text; dashes alone mark blanks and are none. */
const formulaLike = /^'*[=+\-@\t\r]/;
const dashes = /^'*-{1,3}$/;

/**
 * A text as it is written to delimited text, where a program that opens the file could take it for a formula: one that
 * begins with = + - @, a tab or a carriage return gets an apostrophe in front, as does one that has apostrophes and then
 * one of these already. So every text comes back as it was: see unguardFormula.
 */
export function guardFormula(text: string): string {
  return formulaLike.test(text) && !dashes.test(text) ? `'${text}` : text;
}

/** The text that guardFormula was given. */
export function unguardFormula(field: string): string {
  return field.charCodeAt(0) === apostrophe && formulaLike.test(field) && !dashes.test(field) ? field.slice(1) : field;
}

const apostrophe = 39;
