import type { Token as ReadToken } from "@borgar/fx";
import { tokenize } from "@borgar/fx";

export type TokenKind =
  | "prefix"
  | "function"
  | "reference"
  | "name"
  | "number"
  | "text"
  | "word"
  | "error"
  | "open"
  | "close"
  | "separator"
  | "operator"
  | "postfix"
  | "space"
  | "unknown";

/** A piece of a formula; offsets count in its text. */
export interface FormulaToken {
  readonly kind: TokenKind;
  readonly text: string;
  readonly from: number;
  readonly to: number;
}

export function isFormula(text: string): boolean {
  return text.startsWith("=");
}

let lastText = "";
let lastTokens: readonly FormulaToken[] = [];

/**
 * The pieces of a formula by the same reader as the worksheet's, none left out; nothing for a text that is no formula.
 * Several parts of the editor ask for the same text, so the last answer is kept.
 */
export function readTokens(text: string): readonly FormulaToken[] {
  if (text !== lastText) {
    lastTokens = isFormula(text) ? located(tokenize(text, { withLocation: true })) : [];
    lastText = text;
  }
  return lastTokens;
}

function located(tokens: readonly ReadToken[]): FormulaToken[] {
  return tokens.map((token) => {
    const [from, to] = token.loc as [number, number];
    return { kind: kindOf(token), text: token.value, from, to };
  });
}

const kinds: Readonly<Record<string, TokenKind>> = {
  fx_prefix: "prefix",
  func: "function",
  range: "reference",
  range_beam: "reference",
  range_ternary: "reference",
  range_named: "name",
  number: "number",
  string: "text",
  bool: "word",
  error: "error",
  whitespace: "space",
  newline: "space",
};

const signs: Readonly<Record<string, TokenKind>> = {
  "(": "open",
  "{": "open",
  ")": "close",
  "}": "close",
  ",": "separator",
  ";": "separator",
  "%": "postfix",
  "#": "postfix",
  "!": "unknown",
};

function kindOf({ type, value }: ReadToken): TokenKind {
  if (type === "operator") return signs[value] ?? "operator";
  // Single letters that could become the column or row of a reference are on their way to a name.
  if (type === "unknown" && /^\p{L}$/u.test(value)) return "name";
  return kinds[type] ?? "unknown";
}
