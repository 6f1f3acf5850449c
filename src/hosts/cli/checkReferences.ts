import { columnLetters } from "../../sheet/book/address.js";
import { readFormula } from "../../sheet/formula/readFormula.js";
import { type Reference, referenceText, resolve } from "../../sheet/formula/reference.js";
import type { ColumnRequest } from "./columnRequest.js";
import { UsageProblem } from "./usageProblem.js";
import { functions } from "./worksheet.js";

/** Where added columns begin, and where the table ends with them. */
interface Extent {
  readonly first: number;
  readonly end: number;
}

/**
 * Sentences about references that are likely slips. One to the right of the table is refused: the cells there are
 * blank, and blank cells count as 0.
 */
export function checkReferences(
  { header, formula }: ColumnRequest,
  cell: { readonly row: number; readonly column: number },
  { first, end }: Extent,
): string[] {
  const { references } = readFormula(formula, cell.row, cell.column, functions);
  const doubts: string[] = [];
  for (const reference of references) {
    if (!reference || reference.sheet !== undefined) continue;
    const text = referenceText(reference, cell.row, cell.column);
    const { top, left } = resolve(reference, cell.row, cell.column);
    if (left >= end) {
      throw new UsageProblem(
        `the formula of "${header}" refers to ${text}, and the table with its new columns ends at column ${columnLetters(end - 1)}; check the letters.`,
      );
    }
    if (top < cell.row && left < first && moves(reference)) {
      doubts.push(
        `The formula of "${header}" is that of row ${cell.row + 1}, the first with data, and refers to ${text} above it; it moves down row by row. $ keeps a row in place.`,
      );
    }
  }
  return doubts;
}

function moves({ top, whole }: Reference): boolean {
  return whole === undefined && !top.fixed;
}
