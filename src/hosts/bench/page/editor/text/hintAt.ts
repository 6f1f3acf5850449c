import type { FunctionEntry } from "../../../protocol/answers.js";
import { callAt } from "./callAt.js";

/** The call around a caret, as it is told while it is typed. */
export interface Hint {
  readonly entry: FunctionEntry;
  /** The parameter that the caret stands at; undefined past the last one. */
  readonly present: number | undefined;
}

export function hintAt(text: string, caret: number, functions: readonly FunctionEntry[]): Hint | undefined {
  const call = callAt(text, caret);
  const name = call?.name.toUpperCase();
  const entry = functions.find((each) => each.name === name);
  return call && entry && { entry, present: presentOf(entry, call.argument) };
}

/** Parameters that repeat do so as the group they form. */
function presentOf({ parameters }: FunctionEntry, argument: number): number | undefined {
  if (argument < parameters.length) return argument;
  const first = parameters.findIndex(({ repeating }) => repeating);
  return first < 0 ? undefined : first + ((argument - first) % (parameters.length - first));
}
