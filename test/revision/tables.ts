import type { Cell } from "../../src/call/cell.js";
import { columnOf } from "../../src/call/column.js";
import { ownFunctions } from "../../src/files/xlsx/ownFunctions.js";
import { type BookTable, bookTable } from "../../src/revision/bookTable.js";
import type { RevisionTable } from "../../src/revision/pairRevision.js";
import { planRevision, type RevisionPlan, type RevisionRequest } from "../../src/revision/planRevision.js";
import { revisionEdits } from "../../src/revision/revisionEdits.js";
import { sentenceOfRevisionFinding } from "../../src/revision/revisionFinding.js";
import type { Book } from "../../src/sheet/book/book.js";
import { bookOf } from "../../src/sheet/book/bookOf.js";
import { usedColumns, usedRows } from "../../src/sheet/book/usedRows.js";
import { change } from "../../src/sheet/change.js";
import { fillFormula } from "../../src/sheet/edit/fillFormula.js";
import { setCells } from "../../src/sheet/edit/setCells.js";

/** Columns of cells by their headers, as a table file. */
export function revisionOf(columns: Readonly<Record<string, readonly Cell[]>>): RevisionTable {
  const header = Object.keys(columns);
  const cells = Object.values(columns);
  return {
    header,
    unitsRow: undefined,
    columns: cells.map(columnOf),
    rows: cells[0]?.length ?? 0,
    notes: header.map((name) => ({ name, unit: undefined, description: undefined, ucd: undefined })),
  };
}

/** A book of one sheet: columns of cells by their headers, then formulas of row 2 filled down. */
export function bookWith(
  columns: Readonly<Record<string, readonly Cell[]>>,
  formulas: Readonly<Record<string, string>> = {},
): Book {
  const rows = Object.values(columns)[0]?.length ?? 0;
  const typed = Object.entries(columns).map(([header, cells]) => columnOf([header, ...cells]));
  const bare = bookOf([{ name: "Targets", columns: typed }]);
  return Object.entries(formulas).reduce((book, [header, formula]) => {
    const column = usedColumns(book, 0);
    const headed = change(book, [setCells({ sheet: 0, row: 0, column }, [[header]])], ownFunctions);
    return change(headed, [fillFormula({ sheet: 0, column, from: 1, to: rows + 1 }, formula)], ownFunctions);
  }, bare);
}

export function tableIn(book: Book): BookTable {
  return bookTable(book, 0)!;
}

export function plan(book: Book, revision: RevisionTable, request: Partial<RevisionRequest> = {}): RevisionPlan {
  return planRevision(tableIn(book), revision, { key: "Target", ...request });
}

export function sentences({ findings }: RevisionPlan): readonly string[] {
  return findings.map(sentenceOfRevisionFinding);
}

export function applied(book: Book, made: RevisionPlan): Book {
  return change(book, revisionEdits(made), ownFunctions);
}

export function revised(book: Book, revision: RevisionTable, request: Partial<RevisionRequest> = {}): Book {
  return applied(book, plan(book, revision, request));
}

/** Used cells of the first sheet. */
export function sizeOf(book: Book): { readonly rows: number; readonly columns: number } {
  return { rows: usedRows(book, 0), columns: usedColumns(book, 0) };
}

export const source = { date: "2026-03-01T12:00:00.000Z", file: "new.csv", sha256: "0".repeat(64) };
