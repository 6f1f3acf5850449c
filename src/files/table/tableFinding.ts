import type { Finding } from "../delimited/finding.js";
import { sentenceOfFinding } from "../delimited/sentenceOfFinding.js";

/** Something about a file that its owner should know; reading went on. Rows are counted from 1. */
export type TableFinding =
  | Finding
  | { readonly kind: "several-tables"; readonly read: string; readonly others: readonly string[] }
  | { readonly kind: "service-error"; readonly text: string }
  | { readonly kind: "overflow" }
  | { readonly kind: "array-column"; readonly name: string; readonly shape: string }
  | { readonly kind: "unit-aside"; readonly name: string; readonly unit: string }
  | {
      readonly kind: "beyond-limits";
      readonly name: string;
      readonly limits: string;
      readonly count: number;
      readonly row: number;
      readonly value: number;
    }
  | { readonly kind: "outside-columns"; readonly count: number; readonly line: number; readonly text: string }
  | { readonly kind: "across-columns"; readonly count: number; readonly line: number; readonly text: string }
  | {
      readonly kind: "field-count";
      readonly count: number;
      readonly row: number;
      readonly fields: number;
      readonly expected: number;
    }
  | { readonly kind: "row-count"; readonly rows: number; readonly stated: number };

/** A finding as one sentence of at most 250 characters for the analyst. */
export function sentenceOfTableFinding(finding: TableFinding): string {
  switch (finding.kind) {
    case "several-tables":
      return `The file holds ${counted(finding.others.length + 1, "table")}; ${quoted(finding.read)} was read. The others are ${listed(finding.others)}; name one to read it instead.`;
    case "service-error":
      return `The service that made the file reports an error: ${quoted(finding.text, 120)}; the table may be empty or wrong.`;
    case "overflow":
      return "The service that made the file cut the table off (overflow); ask it for more rows if all are needed.";
    case "array-column":
      return `Column ${quoted(finding.name)} holds several values a cell (${finding.shape}); they were read as text.`;
    case "unit-aside":
      return `The unit ${quoted(finding.unit)} of column ${quoted(finding.name)} cannot stand in a header; write it in square brackets by hand.`;
    case "beyond-limits":
      return `Column ${quoted(finding.name)} has ${counted(finding.count, "value")} beyond the limits ${finding.limits} that the file states, first ${finding.value} in row ${finding.row.toLocaleString("en")}.`;
    case "outside-columns":
      return `${counted(finding.count, "line")} ${finding.count === 1 ? "has" : "have"} text outside the columns that the header marks, first line ${finding.line.toLocaleString("en")}: ${quoted(finding.text)}; it was left aside.`;
    case "across-columns":
      return `${counted(finding.count, "line")} ${finding.count === 1 ? "has" : "have"} a word across the place where two columns meet, first line ${finding.line.toLocaleString("en")}, near ${quoted(finding.text)}; it was cut there: check those rows.`;
    case "field-count":
      return `${counted(finding.count, "row")} ${finding.count === 1 ? "has" : "have"} another number of fields than the ${finding.expected} columns, first row ${finding.row.toLocaleString("en")} with ${finding.fields}; what is missing is blank, what is too much was left aside.`;
    case "row-count":
      return `The file says it has ${counted(finding.stated, "row")} and has ${finding.rows.toLocaleString("en")}; it may have been cut off.`;
    default:
      return sentenceOfFinding(finding);
  }
}

function counted(count: number, noun: string): string {
  return `${count.toLocaleString("en")} ${noun}${count === 1 ? "" : "s"}`;
}

function quoted(text: string, most = 40): string {
  return `"${text.length > most ? `${text.slice(0, most - 1)}…` : text}"`;
}

function listed(names: readonly string[]): string {
  const shown = names.slice(0, 3).map((name) => quoted(name, 24));
  const rest = names.length - shown.length;
  return rest > 0 ? `${shown.join(", ")} and ${rest} more` : shown.join(", ");
}
