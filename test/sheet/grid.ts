import type { Cell } from "../../src/call/cell.js";
import { CellError } from "../../src/call/cell.js";
import { readAddress } from "../../src/sheet/book/address.js";
import type { Book, Place } from "../../src/sheet/book/book.js";
import { bookOf } from "../../src/sheet/book/bookOf.js";
import { cellOf } from "../../src/sheet/book/cellOf.js";
import { formulaOf } from "../../src/sheet/book/formulaOf.js";
import { change } from "../../src/sheet/change.js";
import type { Edit } from "../../src/sheet/edit/draft.js";
import { setCells } from "../../src/sheet/edit/setCells.js";
import type { Functions } from "../../src/sheet/formula/functions.js";
import { noFunctions } from "../../src/sheet/formula/functions.js";

/** A place by its address, on the first sheet or another. */
export function at(address: string, sheet = 0): Place {
  return { sheet, ...(readAddress(address) ?? { row: -1, column: -1 }) };
}

/** What the tests type: a text that begins with "=" is a formula. */
export function typed(address: string, ...rows: readonly (readonly Cell[])[]): Edit {
  return setCells(
    at(address),
    rows.map((row) => row.map((cell) => (typeof cell === "string" && cell.startsWith("=") ? { formula: cell } : cell))),
  );
}

/** A book of one empty sheet after some edits. */
export function bookAfter(...edits: readonly Edit[]): Book {
  return change(bookOf([{ name: "Sheet1", columns: [] }]), edits, noFunctions);
}

export function edited(book: Book, edits: readonly Edit[], functions: Functions = noFunctions): Book {
  return change(book, edits, functions);
}

/** The value of a cell; of an error its code. */
export function valueAt(book: Book, address: string, sheet = 0): unknown {
  const cell = cellOf(book, at(address, sheet));
  return cell instanceof CellError ? cell.code : cell;
}

export function messageAt(book: Book, address: string): string {
  const cell = cellOf(book, at(address));
  return cell instanceof CellError ? cell.message : String(cell);
}

export function formulaAt(book: Book, address: string, sheet = 0): string | undefined {
  return formulaOf(book, at(address, sheet));
}

/** Cells below each other. */
export function down(book: Book, address: string, count: number): unknown[] {
  const { sheet, row, column } = at(address);
  return Array.from({ length: count }, (_, index) => {
    const cell = cellOf(book, { sheet, row: row + index, column });
    return cell instanceof CellError ? cell.code : cell;
  });
}
