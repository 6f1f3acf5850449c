import { tokenize } from "@borgar/fx";
import type { Book } from "../../../sheet/book/book.js";
import type { Formula } from "../../../sheet/formula/formula.js";
import { formulaText } from "../../../sheet/formula/formula.js";
import { isOneCell } from "./fileFormula.js";
import { storedText } from "./storedText.js";
import { surveyArrays } from "./surveyArrays.js";

/**
 * How a formula goes into a file: as a formula, as the text that was typed, or, where only the file it came from can
 * calculate it, as the value it had. A worksheet program refuses a whole file for one formula it cannot read.
 */
export type StoredFormula =
  | { readonly kind: "plain" | "array"; textIn(row: number): string }
  | { readonly kind: "text"; textIn(row: number): string }
  | { readonly kind: "value" };

export function storedFormula(formula: Formula, column: number, book: Book): StoredFormula {
  const typed = (row: number): string => formulaText(formula, row, column);
  const kind = kindOf(formula, book);
  if (kind === "value") {
    return { kind };
  }
  if (kind === "text") {
    return { kind, textIn: typed };
  }
  const { needsArray } = surveyArrays(formula, (name) => isOneCell(name, book.names));
  return { kind: needsArray ? "array" : "plain", textIn: (row) => storedText(typed(row)) };
}

function kindOf(formula: Formula, book: Book): "formula" | "text" | "value" {
  const { problem, references } = formula;
  const sheets = new Set(book.sheets.map(({ name }) => name.toUpperCase()));
  if (references.some((each) => each?.sheet !== undefined && !sheets.has(each.sheet.toUpperCase()))) {
    return "text";
  }
  if (problem === undefined || problem.code === "#REF!") {
    return "formula";
  }
  if (refersElsewhere(formula)) {
    return "value";
  }
  // An unknown name or function, and parts that are not supported here, are formulas all the same.
  const isReadable =
    problem.code === "#NAME?" ? / is not a known /.test(problem.topic) : / not supported$/.test(problem.topic);
  return isReadable ? "formula" : "text";
}

/** Whether a formula names another file or a table of the file it came from. */
function refersElsewhere(formula: Formula): boolean {
  return tokenize(formulaText(formula, 0, 0), { withLocation: false }).some(
    ({ type, value }) => type === "structured" || (type.startsWith("range") && value.includes("[")),
  );
}
