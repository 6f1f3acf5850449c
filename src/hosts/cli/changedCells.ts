import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import type { Book, Place } from "../../sheet/book/book.js";
import { columnAt } from "../../sheet/book/book.js";
import { readCell } from "../../sheet/book/cells.js";
import { spanAt } from "../../sheet/book/spans.js";
import { formulaText } from "../../sheet/formula/formula.js";

/** A cell whose value is another than before. */
export interface ChangedCell extends Place {
  readonly before: Cell;
  readonly now: Cell;
  /** Change over the larger of both values; undefined where they are not both numbers. */
  readonly relative: number | undefined;
  /** The formula that gives the value, as its own cell shows it. */
  readonly formula: string;
  /** The formula as seen from its cell: equal in all cells it was filled to. */
  readonly key: string;
}

/** The cells of formulas, and those they fill, that differ between two states of a book by more than rounding. */
export function* changedCells(before: Book, now: Book, tolerance: number): Generator<ChangedCell> {
  for (const [sheet, { columns }] of now.sheets.entries()) {
    for (let column = 0; column < Math.max(columns.length, before.sheets[sheet]?.columns.length ?? 0); column++) {
      const [old, own] = [columnAt(before, sheet, column), columnAt(now, sheet, column)];
      for (let row = 0; row < Math.max(old.cells.length, own.cells.length); row++) {
        const [was, is] = [readCell(old.cells, row), readCell(own.cells, row)];
        const relative = relativeChange(was, is);
        if (isSame(was, is) || (relative !== undefined && Math.abs(relative) <= tolerance)) {
          continue;
        }
        const owner = ownerOf(now, sheet, column, row) ?? ownerOf(before, sheet, column, row);
        yield { sheet, row, column, before: was, now: is, relative, formula: owner?.text ?? "", key: owner?.key ?? "" };
      }
    }
  }
}

/** A formula that refers to a blank cell is worth a blank here and 0 in other programs. */
function isSame(a: Cell, b: Cell): boolean {
  const isNothing = (cell: Cell) => cell === null || cell === "" || cell === 0;
  if (a instanceof CellError && b instanceof CellError) {
    return a.code === b.code;
  }
  return a === b || (isNothing(a) && isNothing(b));
}

function relativeChange(before: Cell, now: Cell): number | undefined {
  if (typeof before !== "number" || typeof now !== "number") {
    return undefined;
  }
  // Halves, because the difference of two large doubles may be beyond all doubles.
  return before === now ? 0 : (now / 2 - before / 2) / (Math.max(Math.abs(before), Math.abs(now)) / 2);
}

function ownerOf(book: Book, sheet: number, column: number, row: number) {
  const claim = spanAt(columnAt(book, sheet, column).claims, row);
  const home = { column: claim?.column ?? column, row: claim?.row ?? row };
  const run = spanAt(columnAt(book, sheet, home.column).runs, home.row);
  return run && { text: formulaText(run.formula, home.row, home.column), key: run.formula.key };
}
