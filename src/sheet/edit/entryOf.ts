import { numberFromText } from "../values/numberFromText.js";
import type { Entry } from "./setCells.js";

/**
 * What a person means who types a text into a cell: a formula after "=", a number, TRUE or FALSE, nothing, or else
 * the text. An apostrophe in front makes a text of anything and is not part of it.
 */
export function entryOf(text: string): Entry {
  if (text === "") {
    return null;
  }
  if (text.startsWith("'")) {
    return text.slice(1);
  }
  if (text.startsWith("=") && text.length > 1) {
    return { formula: text };
  }
  const word = text.trim().toUpperCase();
  if (word === "TRUE" || word === "FALSE") {
    return word === "TRUE";
  }
  return numberFromText(text) ?? text;
}
