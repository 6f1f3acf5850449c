import { lineEndOf, type Newline } from "./dialect.js";
import type { SourceText } from "./sourceText.js";

/** A line of a delimited file that is no part of the table. */
export interface Aside {
  readonly kind: "comment" | "blank";
  /** As it stood, without line ending. */
  readonly text: string;
  /** The number of the line in the file, from 1. */
  readonly line: number;
  /** The record it stands before: 0 the header, then the units row if there is one, then the data rows. */
  readonly beforeRecord: number;
}

/** The comment lines and blank lines of a file, in order. */
export function* asidesOf(source: SourceText, newline: Newline): Generator<Aside> {
  const lineEnd = lineEndOf(newline);
  let line = 1;
  let record = 0;
  for (const [index, text] of source.blocks.entries()) {
    const recordsEnd = source.recordsBefore[index + 1] ?? source.records;
    let from = 0;
    while (from < text.length) {
      const within = record < recordsEnd;
      const to = within ? (source.starts[record] as number) : text.length;
      while (from < to) {
        const found = text.indexOf(lineEnd, from);
        const end = found < 0 || found >= to ? to : found;
        const aside = text.slice(from, end > from && text[end - 1] === "\r" && lineEnd === "\n" ? end - 1 : end);
        yield { kind: aside.startsWith("#") ? "comment" : "blank", text: aside, line, beforeRecord: record };
        line++;
        from = end + 1;
      }
      if (!within) {
        break;
      }
      const recordEnd = text.indexOf(lineEnd, source.ends[record] as number);
      const after = recordEnd < 0 ? text.length : recordEnd + 1;
      line += linesIn(text, source.starts[record] as number, after, lineEnd);
      from = after;
      record++;
    }
  }
}

function linesIn(text: string, from: number, to: number, lineEnd: string): number {
  let lines = 0;
  for (let at = text.indexOf(lineEnd, from); at >= 0 && at < to; at = text.indexOf(lineEnd, at + 1)) {
    lines++;
  }
  return lines;
}
