import type { Token } from "@borgar/fx";
import type { FormulaProblem } from "./formula.js";

/** What keeps a text from being a formula, where, and what to type instead. */
export function explainSyntax(text: string, tokens: readonly Token[], offset: number): FormulaProblem {
  return (
    explainQuote(text, tokens) ??
    explainBrackets(text, tokens) ??
    explainStranger(text, tokens) ??
    explainEnd(text, tokens) ??
    explainPlace(text, tokens, offset)
  );
}

export function syntaxProblem(text: string, position: number, what: string): FormulaProblem {
  const shown = text.length > 60 ? `${text.slice(0, 57)}...` : text;
  return {
    position,
    code: "#NAME?",
    topic: "a formula that cannot be read",
    message: `formula: ${shown} cannot be read at character ${position + 1}: ${what}`,
  };
}

function startOf(token: Token): number {
  return token.loc?.[0] ?? 0;
}

function explainQuote(text: string, tokens: readonly Token[]): FormulaProblem | undefined {
  const open = tokens.find((token) => token.unterminated);
  return open && syntaxProblem(text, startOf(open), 'a text has no end; close it with ", for example "d"');
}

function explainBrackets(text: string, tokens: readonly Token[]): FormulaProblem | undefined {
  const closing: Readonly<Record<string, string>> = { "(": ")", "{": "}" };
  const open: Token[] = [];
  for (const token of tokens) {
    if (token.type !== "operator") {
      continue;
    }
    if (closing[token.value] !== undefined) {
      open.push(token);
    } else if (token.value === ")" || token.value === "}") {
      const last = open.pop();
      if (last === undefined || closing[last.value] !== token.value) {
        return syntaxProblem(
          text,
          startOf(token),
          `nothing opens this "${token.value}"; take it out or open it before`,
        );
      }
    }
  }
  const first = open[0];
  return (
    first && syntaxProblem(text, startOf(first), `this "${first.value}" is never closed; add "${closing[first.value]}"`)
  );
}

function explainStranger(text: string, tokens: readonly Token[]): FormulaProblem | undefined {
  let inArray = 0;
  for (const token of tokens) {
    inArray += token.value === "{" ? 1 : token.value === "}" ? -1 : 0;
    if (token.type === "unknown" || token.type === "context" || token.type === "context_quote") {
      return syntaxProblem(
        text,
        startOf(token),
        `"${token.value}" is no number, cell, name or operator; for example =B2*1.5`,
      );
    }
    if (token.value === ";" && inArray === 0) {
      return syntaxProblem(text, startOf(token), 'arguments are separated by ",", for example =MAX(B2,C2)');
    }
  }
  return undefined;
}

function explainEnd(text: string, tokens: readonly Token[]): FormulaProblem | undefined {
  const last = tokens.filter((token) => token.type !== "whitespace" && token.type !== "newline").at(-1);
  if (last === undefined || last.type === "fx_prefix") {
    return syntaxProblem(text, text.length, "nothing follows; a number, cell or function is needed, for example =B2*2");
  }
  if (last.type === "operator" && !/^[)}%#]$/.test(last.value)) {
    const what = `nothing follows "${last.value}"; a number, cell or function is needed`;
    return syntaxProblem(text, text.length, what);
  }
  return undefined;
}

function explainPlace(text: string, tokens: readonly Token[], offset: number): FormulaProblem {
  const token = tokens.find((each) => (each.loc?.[1] ?? 0) >= offset);
  if (token === undefined) {
    return syntaxProblem(text, text.length, "it ends too early; a value is needed");
  }
  return syntaxProblem(
    text,
    startOf(token),
    `"${token.value}" does not belong here; an operator or a value is missing`,
  );
}
