import { readTokens } from "./tokens.js";

/** The call that a caret stands in. */
export interface CallAtCaret {
  readonly name: string;
  /** Where its name begins. */
  readonly from: number;
  /** Counts from zero. */
  readonly argument: number;
}

/** The innermost call with a name around the caret; brackets and lists without a name belong to the argument they stand in. */
export function callAt(text: string, caret: number): CallAtCaret | undefined {
  const open: { readonly name: string; readonly from: number; argument: number }[] = [];
  let called = { name: "", from: 0 };
  for (const token of readTokens(text)) {
    if (token.to > caret) break;
    if (token.kind === "open") open.push({ ...called, argument: 0 });
    else if (token.kind === "close") open.pop();
    else if (token.kind === "separator" && open.length > 0) open[open.length - 1]!.argument += 1;
    called = token.kind === "function" ? { name: token.text, from: token.from } : { name: "", from: 0 };
  }
  return open.findLast((call) => call.name !== "");
}
