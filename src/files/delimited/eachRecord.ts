import Papa from "papaparse";
import { type Delimiter, lineEndOf, type Newline } from "./dialect.js";

/** What was wrong with the quotes of a record: text after a closing quote, or no closing quote before the file ends. */
export type QuoteTrouble = "stray" | "unclosed" | undefined;

/** One record: its fields, and where its text lies, without line ending. */
export type TakeRecord = (fields: string[], start: number, end: number, trouble: QuoteTrouble) => void;

const carriageReturn = 13;
const quote = 34;
const hash = 35;

/**
 * Parses the whole records of a text that begins at a line start, and gives the number of characters they fill; a record
 * the text may have cut off is left for the next time unless the text is the last. Blank lines come as records.
 */
export function eachRecord(
  text: string,
  delimiter: Delimiter,
  newline: Newline,
  last: boolean,
  take: TakeRecord,
): number {
  const lineEnd = lineEndOf(newline);
  let next = 0;
  const step = ({ data, errors, meta }: Papa.ParseStepResult<string[][]>) => {
    const fields = data[0] as string[];
    const trouble = quoteTrouble(errors);
    const start = afterComments(text, next, lineEnd);
    next = meta.cursor;
    let end = next;
    if (trouble !== "unclosed" && end > start && text[end - 1] === lineEnd) {
      end--;
      if (lineEnd === "\n" && end > start && text.charCodeAt(end - 1) === carriageReturn) {
        end--;
        dropCarriageReturn(fields, text, start, end, delimiter);
      }
    }
    if (trouble === "unclosed") {
      fields.push((fields.pop() as string).replaceAll('""', '"'));
    }
    take(fields, start, end, trouble);
  };
  new Papa.Parser({ delimiter, newline: lineEnd, comments: "#", quoteChar: '"', step }).parse(text, 0, !last);
  return last ? text.length : next;
}

/** The parser passes over comment lines in silence; they stand before the record it gives next. */
function afterComments(text: string, from: number, lineEnd: string): number {
  let at = from;
  while (text.charCodeAt(at) === hash) {
    at = text.indexOf(lineEnd, at) + 1;
  }
  return at;
}

function quoteTrouble(errors: readonly Papa.ParseError[]): QuoteTrouble {
  if (errors.length === 0) {
    return undefined;
  }
  return errors.some((error) => error.code === "MissingQuotes") ? "unclosed" : "stray";
}

/**
 * The parser splits lines at the line feed, so that a file may mix its line endings. The carriage return before it then
 * stands in the last field, unless that field is quoted and the carriage return is its own.
 */
function dropCarriageReturn(fields: string[], text: string, start: number, end: number, delimiter: Delimiter): void {
  const field = fields[fields.length - 1] as string;
  if (field.charCodeAt(field.length - 1) !== carriageReturn) {
    return;
  }
  const fieldStart = end + 1 - field.length;
  if (
    text.charCodeAt(end - 1) !== quote ||
    (text.startsWith(field, fieldStart) && (fieldStart === start || text[fieldStart - 1] === delimiter))
  ) {
    fields[fields.length - 1] = field.slice(0, -1);
  }
}
