import type { ColumnSpan } from "../book/book.js";
import { blankColumn } from "../book/cells.js";
import { readFormula } from "../formula/readFormula.js";
import type { Edit } from "./draft.js";
import { writeContent } from "./draft.js";
import { placeFormula } from "./placeFormula.js";

/** Puts a formula, as typed in the first row of the span, in all its rows: what is relative moves along. */
export function fillFormula(span: ColumnSpan, text: string): Edit {
  const { column, from, to } = span;
  return (draft) => {
    const formula = readFormula(text, from, column, draft.functions);
    writeContent(draft, span, blankColumn(to - from), placeFormula(formula, column, from, to));
  };
}
