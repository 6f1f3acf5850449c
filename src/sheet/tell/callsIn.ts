import { tokenize } from "@borgar/fx";

/** A call as it stands in the text of a formula, which may be unfinished; offsets count characters of the text. */
export interface CallText {
  /** In capital letters. */
  readonly name: string;
  readonly from: number;
  readonly to: number;
  /** Behind the opening bracket. */
  readonly open: number;
  /** The closing bracket; undefined where it is not there yet. */
  readonly close: number | undefined;
  /** One more than there are commas; an argument that was left out is empty. */
  readonly parts: readonly TextSpan[];
}

export interface TextSpan {
  readonly from: number;
  readonly to: number;
}

interface OpenBracket {
  readonly name: string | undefined;
  readonly from: number;
  readonly to: number;
  readonly open: number;
  readonly parts: TextSpan[];
  start: number;
}

/** The calls in a text, in the order of their opening brackets. */
export function callsIn(text: string): readonly CallText[] {
  const open: OpenBracket[] = [];
  const calls: CallText[] = [];
  const tokens = tokenize(text, { withLocation: true });
  const end = (bracket: OpenBracket, at: number, close: number | undefined): void => {
    const { name, from, to, open, parts, start } = bracket;
    if (name !== undefined) calls.push({ name, from, to, open, close, parts: [...parts, { from: start, to: at }] });
  };
  for (const [index, token] of tokens.entries()) {
    const [from, to] = token.loc as [number, number];
    if (token.type !== "operator") continue;
    const last = open.at(-1);
    if (token.value === "(" || token.value === "{") {
      const before = tokens[index - 1];
      const called = token.value === "(" && before?.type === "func" ? before : undefined;
      const [nameFrom, nameTo] = (called?.loc ?? [from, from]) as [number, number];
      open.push({ name: called?.value.toUpperCase(), from: nameFrom, to: nameTo, open: to, parts: [], start: to });
    } else if (token.value === "," && last !== undefined) {
      last.parts.push({ from: last.start, to: from });
      last.start = to;
    } else if ((token.value === ")" || token.value === "}") && last !== undefined) {
      open.pop();
      end(last, from, from);
    }
  }
  for (const bracket of open) end(bracket, text.length, undefined);
  return calls.sort((a, b) => a.open - b.open);
}
