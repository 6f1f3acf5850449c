import { type Column, sliceColumn } from "../../call/column.js";
import type { AddedColumn } from "../../files/delimited/appendColumns.js";
import { addressText, columnLetters } from "../../sheet/book/address.js";
import { type Book, columnAt } from "../../sheet/book/book.js";
import { type CellProblem, listProblems } from "../../sheet/book/listProblems.js";
import { readColumn } from "../../sheet/book/readColumn.js";
import { resultWidth } from "../../sheet/book/resultWidth.js";
import { spansIn } from "../../sheet/book/spans.js";
import { changeWatched } from "../../sheet/change.js";
import { fillFormula } from "../../sheet/edit/fillFormula.js";
import { setCells } from "../../sheet/edit/setCells.js";
import { readHeader } from "../../units/readHeader.js";
import { checkReferences } from "./checkReferences.js";
import type { ColumnRequest } from "./columnRequest.js";
import { headersOfResult } from "./headersOfResult.js";
import type { Progress } from "./progress.js";
import { headerRows, type SheetTable, tableBook } from "./tableBook.js";
import { UsageProblem } from "./usageProblem.js";
import { functions } from "./worksheet.js";

export interface FilledColumn extends AddedColumn {
  /** Where it stands in the worksheet. */
  readonly letters: string;
}

export interface FilledTable {
  /** The worksheet with the columns added. */
  readonly book: Book;
  /** The added columns as another state of that worksheet has them. */
  columnsIn(book: Book): readonly FilledColumn[];
  readonly added: readonly FilledColumn[];
  readonly problems: readonly CellProblem[];
  /** Sentences about formulas that may not mean what they say. */
  readonly doubts: readonly string[];
}

interface Rows {
  readonly from: number;
  readonly to: number;
}

/** The columns that one request takes. */
interface Place {
  readonly column: number;
  readonly headers: readonly string[];
  readonly unit: string | undefined;
}

/** Adds columns to the right of a table, one after the other, each formula filled down over all rows. */
export function fillTable(table: SheetTable, requests: readonly ColumnRequest[], progress: Progress): FilledTable {
  const rows = { from: headerRows(table), to: headerRows(table) + table.rows };
  let book = tableBook(table);
  let column = table.columns.length;
  const places: Place[] = [];
  for (const request of requests) {
    const { header, formula } = request;
    const unit = readHeader(header).unit?.text;
    const span = { sheet: 0, column, ...rows };
    book = addHeaders(book, { column, headers: [header], unit }, rows.from);
    if (table.rows > 0) {
      const watch = { onProgress: (done: number) => progress.show(`calculating ${header}`, done) };
      book = changeWatched(book, [fillFormula(span, formula)], functions, watch)!;
      refuseSeveralRows(book, request, column, rows);
    }
    const headers = headersOfResult(request, table.rows > 0 ? resultWidth(book, span) : 1);
    places.push({ column, headers, unit });
    book = addHeaders(book, { column, headers, unit }, rows.from);
    column += headers.length;
  }
  const doubts = places.flatMap((place, index) =>
    checkReferences(
      requests[index]!,
      { row: rows.from, column: place.column },
      { first: table.columns.length, end: column },
    ),
  );
  const columnsIn = (state: Book) => places.flatMap((place) => addedColumns(state, place, rows));
  const added = columnsIn(book);
  const problems = added.flatMap((_, index) =>
    table.rows > 0 ? listProblems(book, { sheet: 0, column: table.columns.length + index, ...rows }) : [],
  );
  return { book, columnsIn, added, problems, doubts };
}

function addHeaders(book: Book, { column, headers, unit }: Place, rows: number): Book {
  const cells = rows === 1 ? [headers] : [headers, headers.map(() => unit ?? null)];
  return changeWatched(book, [setCells({ sheet: 0, row: 0, column }, cells)], functions, {})!;
}

/** A result of several rows would stand over the rows below, of which each has its own. */
function refuseSeveralRows(book: Book, { header }: ColumnRequest, column: number, { from, to }: Rows): void {
  const tall = spansIn(columnAt(book, 0, column).spills, from, to).find(({ rows }) => rows > 1);
  if (!tall) return;
  const address = addressText(Math.max(tall.from, from), column);
  throw new UsageProblem(
    `the formula of "${header}" gives ${tall.rows} rows of results in ${address}; it is filled down, so refer to one cell of each column, B${from + 1} rather than B${from + 1}:B${Math.max(to, from + 2)}.`,
  );
}

function addedColumns(book: Book, { column, headers, unit }: Place, rows: Rows): FilledColumn[] {
  return headers.map((header, index) => ({
    header,
    column: dataOf(book, column + index, rows),
    letters: columnLetters(column + index),
    ...(unit === undefined ? {} : { unit }),
  }));
}

function dataOf(book: Book, column: number, rows: Rows): Column {
  const data = readColumn(book, { sheet: 0, column, ...rows });
  return data.length === rows.to - rows.from ? data : sliceColumn(data, 0, rows.to - rows.from);
}
