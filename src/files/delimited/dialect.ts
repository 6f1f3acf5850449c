import type { TextEncoding } from "../text/textSource.js";

export const delimiters = [",", "\t", ";", "|"] as const;

export type Delimiter = (typeof delimiters)[number];

export type Newline = "\n" | "\r\n" | "\r";

/** The character at which a file's lines are split; a carriage return before a line feed belongs to the line ending. */
export function lineEndOf(newline: Newline): "\n" | "\r" {
  return newline === "\r" ? "\r" : "\n";
}

/** How a delimited file is written. Fields are quoted by `"`, comment lines begin with `#`. */
export interface Dialect {
  readonly delimiter: Delimiter;
  /** The most frequent line ending; a file's own endings are kept one by one. */
  readonly newline: Newline;
  readonly byteOrderMark: boolean;
  /** What the file's bytes were; text that came as text counts as UTF-8. */
  readonly encoding: TextEncoding;
}
