import type { Token } from "@borgar/fx";
import { tokenize } from "@borgar/fx";
import { storedName } from "./futureFunctions.js";

/** The text of a formula as a file holds it, without "=", from the text as typed: what `plainFormula` undoes. */
export function storedText(text: string): string {
  const tokens = tokenize(text, { withLocation: false, mergeRefs: true });
  const from = tokens[0]?.type === "fx_prefix" ? 1 : 0;
  return write(tokens, from, tokens.length, localNames(tokens));
}

function write(tokens: readonly Token[], from: number, to: number, locals: ReadonlySet<string>): string {
  let text = "";
  for (let at = from; at < to; at++) {
    const { type, value } = tokens[at] as Token;
    if (type === "func") {
      text += storedName(value);
    } else if (type === "operator" && value === "@") {
      const end = endOfOperand(tokens, at + 1);
      text += `_xlfn.SINGLE(${write(tokens, at + 1, end, locals).trim()})`;
      at = end - 1;
    } else if (isReference(type) && isOperator(tokens[at + 1], "#")) {
      text += `_xlfn.ANCHORARRAY(${value})`;
      at++;
    } else {
      text += type === "range_named" && locals.has(value.toUpperCase()) ? `_xlpm.${value}` : value;
    }
  }
  return text;
}

const isReference = (type: string): boolean => type.startsWith("range");
const isBlank = (token: Token | undefined): boolean => token?.type === "whitespace" || token?.type === "newline";
const isOperator = (token: Token | undefined, value: string): boolean =>
  token?.type === "operator" && token.value === value;

/** Where the operand that follows "@" ends. */
function endOfOperand(tokens: readonly Token[], from: number): number {
  let at = from;
  while (isBlank(tokens[at])) {
    at++;
  }
  if (tokens[at]?.type === "func") {
    at++;
  }
  if (isOperator(tokens[at], "(")) {
    for (let depth = 0; at < tokens.length; at++) {
      depth += isOperator(tokens[at], "(") ? 1 : isOperator(tokens[at], ")") ? -1 : 0;
      if (depth === 0) {
        break;
      }
    }
  }
  return isOperator(tokens[at + 1], "#") ? at + 2 : at + 1;
}

/** The names that LET gives, in capital letters. */
function localNames(tokens: readonly Token[]): ReadonlySet<string> {
  const names = new Set<string>();
  for (const [at, { type, value }] of tokens.entries()) {
    if (type === "func" && value.toUpperCase() === "LET") {
      for (const name of namesOfLet(tokens, at + 1)) {
        names.add(name.toUpperCase());
      }
    }
  }
  return names;
}

/** Every other argument of a LET, from the first on, is a name; the last is none. */
function namesOfLet(tokens: readonly Token[], from: number): string[] {
  const names: string[] = [];
  let depth = 0;
  let argument = 0;
  let isStart = false;
  for (const token of tokens.slice(from)) {
    const isOpening = token.type === "operator" && /^[({]$/.test(token.value);
    if (isOpening) {
      isStart = ++depth === 1;
    } else if (token.type === "operator" && /^[)}]$/.test(token.value)) {
      if (--depth === 0) {
        break;
      }
    } else if (depth === 1 && isOperator(token, ",")) {
      argument++;
      isStart = true;
    } else if (!isBlank(token)) {
      if (isStart && argument % 2 === 0 && token.type === "range_named") {
        names.push(token.value);
      }
      isStart = false;
    }
  }
  return names;
}
