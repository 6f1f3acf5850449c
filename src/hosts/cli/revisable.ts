import { cellAt } from "../../call/column.js";
import type { TableFile } from "../../files/table/tableFile.js";
import { sentenceOfTableFinding } from "../../files/table/tableFinding.js";
import { chosenSheet } from "../../files/table/tableOfWorkbook.js";
import { writeWorkbook } from "../../files/xlsx/writeWorkbook.js";
import { bookTable } from "../../revision/bookTable.js";
import type { Book } from "../../sheet/book/book.js";
import { readColumn } from "../../sheet/book/readColumn.js";
import { change } from "../../sheet/change.js";
import type { Workbook } from "../../sheet/display/workbook.js";
import { recalculate } from "../../sheet/edit/recalculate.js";
import { sameValue } from "../../table/changeOf.js";
import { changedCells } from "./changedCells.js";
import { counted } from "./changeLines.js";
import type { ColumnRequest } from "./columnRequest.js";
import { filledPieces } from "./filledPieces.js";
import { fillTable } from "./fillTable.js";
import type { Progress } from "./progress.js";
import { headerRows } from "./tableBook.js";
import type { TablePieces } from "./tablePieces.js";
import { UsageProblem } from "./usageProblem.js";
import { functions } from "./worksheet.js";

/** A file with a table that can be revised: its worksheet, and how another state of it is written. */
export interface Revisable {
  readonly book: Book;
  readonly sheet: number;
  /** Sentences on the file. */
  readonly notes: readonly string[];
  pieces(after: Book, out: string): Promise<TablePieces>;
}

/** A table, with the columns that are worked out for it. */
export function revisableTable(table: TableFile, requests: readonly ColumnRequest[], progress: Progress): Revisable {
  const { book, columnsIn, doubts, problems } = fillTable(table, requests, progress);
  const firstRow = headerRows(table);
  if (bookTable(book, 0)?.firstRow !== firstRow) {
    throw new UsageProblem("the row of column names cannot be told from the data; give every column a name in words.");
  }
  const findings = [...table.findings.map(sentenceOfTableFinding), ...doubts];
  return {
    book,
    sheet: 0,
    notes: [
      ...findings,
      ...problems.map(({ address, count, message }) => `${address}, ${counted(count, "cell")}: ${message}`),
    ],
    pieces(after, out) {
      const replaced = table.columns.flatMap((before, index) => {
        if (after.sheets[0]!.columns[index] === book.sheets[0]!.columns[index]) return [];
        const column = readColumn(after, { sheet: 0, column: index, from: firstRow, to: firstRow + table.rows });
        return [{ index, column, isReplaced: (row: number) => !sameValue(cellAt(before, row), cellAt(column, row)) }];
      });
      return filledPieces(table, columnsIn(after), out, replaced);
    },
  };
}

/** Programs that store 15 digits are off by up to 5e-15; a few steps of rounding in a formula are far below this. */
const rounding = 1e-12;

/** A sheet of a workbook. What its formulas give is calculated first, so that only the revision moves anything. */
export function revisableWorkbook(workbook: Workbook, asked: string | undefined): Revisable {
  const { sheet } = chosenSheet(workbook.book, asked);
  const book = change(workbook.book, [recalculate(({ problem }) => problem === undefined)], functions);
  let stale = 0;
  for (const _ of changedCells(workbook.book, book, rounding)) stale++;
  const notes = [...workbook.notes];
  if (stale > 0) {
    notes.push(
      `${counted(stale, "value")} in the workbook ${stale === 1 ? "was" : "were"} not what its formulas give; the ledger begins with what they give. barycell recalc lists them.`,
    );
  }
  return {
    book,
    sheet,
    notes,
    async pieces(after) {
      return { pieces: [await writeWorkbook({ ...workbook, book: after })], losses: [] };
    },
  };
}
