import { columnLetters } from "../../sheet/book/address.js";
import type { Finding, Place } from "./finding.js";

/** A finding as one sentence of at most 250 characters for the analyst. */
export function sentenceOfFinding(finding: Finding): string {
  switch (finding.kind) {
    case "short-rows":
      return `${where(finding.first)} has ${counted(finding.fields, "field")} where the header has ${finding.expected}${more(finding.count)}; the missing cells are blank.`;
    case "long-rows":
      return `${where(finding.first)} has ${counted(finding.fields, "field")} where the header has ${finding.expected}${more(finding.count)}; ${headerless(finding.expected, finding.columns)} no header, added columns stand to the right of that. Is a delimiter inside a text without quotes?`;
    case "stray-quotes":
      return `${where(finding.first)} has text after a closing quote${more(finding.count)}; the quotes were kept as part of the text. Write a quote within quotes twice.`;
    case "unclosed-quote":
      return `${where(finding.first)} opens a quote that is never closed; all that follows was read as one field. Close the quote, or write it twice within quotes.`;
    case "duplicate-header":
      return `The header ${quoted(finding.header)} stands over columns ${listed(finding.columns)}; refer to them by their letters, or rename all but one.`;
    case "empty-headers":
      return `${finding.columns.length === 1 ? "Column" : "Columns"} ${listed(finding.columns)} ${finding.columns.length === 1 ? "has" : "have"} no header; refer to them by their letters, or name them in the file.`;
    case "numbers-as-header":
      return `The first row (${quoted(finding.header)} ...) was taken as the header but holds numbers only; put a row of column names above it.`;
    case "one-column":
      return "The table has a single column; if there should be more, name the character between them: comma, semicolon, tab or bar.";
    case "no-rows":
      return "The table has a header and no rows.";
    case "other-encoding":
      return `The file was written in ${finding.encoding.toUpperCase()}; it is read in full, and what is saved from it is UTF-8.`;
  }
}

function where({ row, line }: Place): string {
  return row < 1 ? `Line ${line} (above the first row)` : `Line ${line} (row ${row})`;
}

function headerless(from: number, to: number): string {
  const [first, last] = [columnLetters(from), columnLetters(to - 1)];
  return first === last ? `column ${last} has` : `columns ${first} to ${last} have`;
}

function more(count: number): string {
  return count === 1 ? "" : `, and so on in ${counted(count, "row")} in all`;
}

function counted(count: number, noun: string): string {
  return `${count.toLocaleString("en")} ${noun}${count === 1 ? "" : "s"}`;
}

function quoted(text: string): string {
  return `"${text.length > 40 ? `${text.slice(0, 39)}…` : text}"`;
}

function listed(columns: readonly number[]): string {
  const shown = columns.slice(0, 5).map(columnLetters);
  const rest = columns.length - shown.length;
  const last = rest > 0 ? `${rest} more` : (shown.pop() as string);
  return shown.length === 0 ? last : `${shown.join(", ")} and ${last}`;
}
