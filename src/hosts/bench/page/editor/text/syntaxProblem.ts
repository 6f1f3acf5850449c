import { parse, tokenize } from "@borgar/fx";
import { explainSyntax, syntaxProblem as problemAt } from "../../../../../sheet/formula/explainSyntax.js";
import { isFormula, readTokens } from "./tokens.js";

/** As much as a worksheet reads. */
const longestFormula = 8192;

export interface SyntaxProblem {
  readonly position: number;
  readonly message: string;
}

/** What keeps a text from being read as a formula, by the worksheet's own sentences; nothing for other texts. */
export function syntaxProblem(text: string): SyntaxProblem | undefined {
  // A "=" alone is entered as a text.
  if (!isFormula(text) || text.length === 1) return undefined;
  if (text.length > longestFormula) {
    return problemAt(text, longestFormula, `it has ${text.length} characters; ${longestFormula} are the most`);
  }
  const tokens = tokenize(text, { withLocation: true });
  try {
    parse(tokens);
    return undefined;
  } catch (thrown) {
    if (thrown instanceof RangeError)
      return problemAt(text, 0, "it is nested too deeply; split it over several columns");
    return explainSyntax(text, tokens, (thrown as { sourceOffset?: number }).sourceOffset ?? text.length);
  }
}

/** The formula with the brackets closed that were left open at its end, where that is all it lacks; else as it came. */
export function closedAtEnd(text: string): string {
  const tokens = readTokens(text).filter((token) => token.kind !== "space");
  const last = tokens.at(-1);
  if (!last || !["reference", "name", "number", "word", "close", "postfix"].includes(last.kind)) return text;
  let depth = 0;
  for (const token of tokens) {
    if (token.text === "(") depth += 1;
    if (token.text === ")") depth -= 1;
  }
  const closed = text + ")".repeat(Math.max(0, depth));
  return depth > 0 && syntaxProblem(closed) === undefined ? closed : text;
}

/** The text breaks off where it is still being typed: after an operator or a comma, or inside brackets. */
export function isUnfinished(text: string, caret: number): boolean {
  const last = readTokens(text).findLast((token) => token.kind !== "space")?.kind;
  const breaksOff = last === "operator" || last === "open" || last === "separator" || closedAtEnd(text) !== text;
  return caret >= text.trimEnd().length && breaksOff;
}
