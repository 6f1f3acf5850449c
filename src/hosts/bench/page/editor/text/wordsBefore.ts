import { isFormula, readTokens } from "./tokens.js";

/** Words in front of the caret that something may be offered for. */
export interface WordsBefore {
  /** The last word, and where it begins; empty after a blank. */
  readonly word: string;
  readonly from: number;
  /** All words since the last sign: a question. */
  readonly phrase: string;
  readonly phraseFrom: number;
  /** The word is a cell as it stands, LOG10, and may be a function on its way. */
  readonly isReference: boolean;
}

export function wordsBefore(text: string, caret: number): WordsBefore | undefined {
  const tokens = readTokens(text).filter((token) => token.from < caret);
  const last = tokens.at(-1);
  if (!last || last.to > caret) return undefined;
  if (last.kind === "reference") {
    // Cells have short letters; only what could be the name of a function goes on.
    if (!/^\p{L}{3}\d+$/u.test(last.text)) return undefined;
    return { word: last.text, from: last.from, phrase: "", phraseFrom: last.from, isReference: true };
  }
  const start = tokens.findLastIndex((token) => token.kind !== "name" && token.kind !== "space") + 1;
  const first = tokens.slice(start).find((token) => token.kind === "name");
  if (!first) return undefined;
  const word = last.kind === "name" ? last : { text: "", from: caret };
  return {
    word: word.text,
    from: word.from,
    phrase: text.slice(first.from, caret).trim(),
    phraseFrom: first.from,
    isReference: false,
  };
}

/** A text that is a question rather than a value: words alone. */
export function questionIn(text: string): string | undefined {
  const words = text.trim();
  return !isFormula(text) && words.length >= 4 && /^\p{L}[\p{L}\s'-]*\??$/u.test(words) ? words : undefined;
}
