import type { Cell } from "../../../../call/cell.js";
import type { BookDocument } from "../../../../files/bookFile/bookDocument.js";
import { fieldOfCell } from "../../../../files/cell/fieldOfCell.js";
import type { DescribedTable } from "../../../../files/table/describedTable.js";
import { headerOfField } from "../../../../files/table/headerOfField.js";
import type { ColumnNotes } from "../../../../files/table/tableFile.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { readColumn } from "../../../../sheet/book/readColumn.js";
import { usedColumns, usedRows } from "../../../../sheet/book/usedRows.js";
import { tableOf } from "../../../../table/tableOf.js";
import { namedHeader } from "./namedHeader.js";
import { notesOfBook } from "./notesSheet.js";

/**
 * A sheet as a table to be written: headers from the first row, a row of units where one follows, and what the sheet of
 * notes says of them; or, as it stands, every row below the first as data.
 */
export function describedSheet({ book, title }: BookDocument, sheet: number, how?: "as it stands"): DescribedTable {
  const indices = [...Array(usedColumns(book, sheet)).keys()];
  const rowOf = (row: number): Cell[] => indices.map((column) => cellOf(book, { sheet, row, column }));
  const top = rowOf(0).map(fieldOfCell);
  const found = how === undefined ? tableOf([rowOf(0), rowOf(1), rowOf(2)]) : undefined;
  const unitsRow = found?.headerRow === 0 && found.unitRow === 1 ? rowOf(1).map(fieldOfCell) : undefined;
  const from = unitsRow ? 2 : 1;
  const to = Math.max(from, usedRows(book, sheet));
  const columns = indices.map((column) => readColumn(book, { sheet, column, from, to }));
  const { notes, remarks } = how === undefined ? notesOfBook(book, top) : {};
  const header = top.map((text, index) => ownHeader(text, notes?.[index]));
  return { header, unitsRow, columns, notes, remarks, name: title };
}

/** The header that the file had, where only its UCD was added to it when it was opened. */
function ownHeader(header: string, notes: ColumnNotes | undefined): string {
  const own = notes && headerOfField(notes);
  return own !== undefined && namedHeader(own, undefined, notes?.ucd) === header ? own : header;
}

/** What of a book a table of one sheet's values leaves out. */
export function valuesSentences({ book }: BookDocument, sheet: number): string[] {
  const formulas = (book.sheets[sheet]?.columns ?? []).reduce(
    (sum, { runs }) => sum + runs.reduce((rows, { from, to }) => rows + to - from, 0),
    0,
  );
  if (formulas === 0) return [];
  const [counted, their] =
    formulas === 1 ? ["1 formula is", "its value"] : [`${formulas.toLocaleString("en")} formulas are`, "their values"];
  return [`${counted} written as ${their}; a workbook or a Barycell book keeps formulas.`];
}
