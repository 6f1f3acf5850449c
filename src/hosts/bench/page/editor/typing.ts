import type { Place } from "../../../../sheet/book/book.js";
import type { FunctionEntry } from "../../protocol/answers.js";
import type { Page } from "../page.js";

/** What the parts of the editor know of the text being typed. */
export interface Typing {
  readonly page: Page;
  /** Where the text will go; undefined while nothing is typed. */
  place(): Place | undefined;
  isInLine(): boolean;
  /** Empty until the worker told them. */
  functions(): readonly FunctionEntry[];
  /** Whether arrows pick cells rather than move the caret. */
  arrowsPick(): boolean;
}

export function sheetNames(page: Page): string[] {
  return page.state().sheets.map(({ name }) => name);
}
