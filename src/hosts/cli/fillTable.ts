import { type Column, sliceColumn } from "../../call/column.js";
import type { AddedColumn } from "../../files/delimited/appendColumns.js";
import type { DelimitedTable } from "../../files/delimited/delimitedTable.js";
import { columnLetters } from "../../sheet/book/address.js";
import type { Book } from "../../sheet/book/book.js";
import { type CellProblem, listProblems } from "../../sheet/book/listProblems.js";
import { readColumn } from "../../sheet/book/readColumn.js";
import { resultWidth } from "../../sheet/book/resultWidth.js";
import { changeWatched } from "../../sheet/change.js";
import { fillFormula } from "../../sheet/edit/fillFormula.js";
import { setCells } from "../../sheet/edit/setCells.js";
import { readHeader } from "../../units/readHeader.js";
import type { Progress } from "./progress.js";
import { headerRows, tableBook } from "./tableBook.js";
import { functions } from "./worksheet.js";

/** A column asked for: its header, and the formula of its first data row. */
export interface ColumnRequest {
  readonly header: string;
  readonly formula: string;
}

export interface FilledColumn extends AddedColumn {
  /** Where it stands in the worksheet. */
  readonly letters: string;
}

export interface FilledTable {
  readonly added: readonly FilledColumn[];
  readonly problems: readonly CellProblem[];
}

/** Adds columns to the right of a table, one after the other, each formula filled down over all rows. */
export function fillTable(table: DelimitedTable, requests: readonly ColumnRequest[], progress: Progress): FilledTable {
  const first = headerRows(table);
  const rows = { from: first, to: first + table.rows };
  let book = tableBook(table);
  let next = table.columns.length;
  const added: FilledColumn[] = [];
  const problems: CellProblem[] = [];
  for (const { header, formula } of requests) {
    const unit = readHeader(header).unit?.text;
    book = addHeaders(book, next, [header], unit, first);
    if (table.rows > 0) {
      const span = { sheet: 0, column: next, ...rows };
      const watch = { onProgress: (done: number) => progress.show(`calculating ${header}`, done) };
      book = changeWatched(book, [fillFormula(span, formula)], functions, watch)!;
      problems.push(...listProblems(book, span));
    }
    const width = table.rows > 0 ? resultWidth(book, { sheet: 0, column: next, ...rows }) : 1;
    const headers = [header, ...sigmaHeaders(header, width - 1)];
    book = addHeaders(book, next, headers, unit, first);
    headers.forEach((text, index) => {
      const column = dataOf(book, next + index, rows);
      added.push({
        header: text,
        column,
        letters: columnLetters(next + index),
        ...(unit === undefined ? {} : { unit }),
      });
      if (index > 0 && table.rows > 0)
        problems.push(...listProblems(book, { sheet: 0, column: next + index, ...rows }));
    });
    next += width;
  }
  return { added, problems };
}

function addHeaders(
  book: Book,
  column: number,
  headers: readonly string[],
  unit: string | undefined,
  rows: number,
): Book {
  const cells = rows === 1 ? [headers] : [headers, headers.map(() => unit ?? null)];
  return changeWatched(book, [setCells({ sheet: 0, row: 0, column }, cells)], functions, {})!;
}

/** Headers of the columns that uncertainties fill beside a result: one, or the upper and the lower. */
function sigmaHeaders(header: string, count: number): string[] {
  const { name, unit } = readHeader(header);
  const text = (sign: string) => `${name || header} sigma${sign}${unit ? ` [${unit.text}]` : ""}`;
  return count === 0 ? [] : count === 1 ? [text("")] : [text("+"), text("-")];
}

function dataOf(book: Book, column: number, rows: { readonly from: number; readonly to: number }): Column {
  const data = readColumn(book, { sheet: 0, column, ...rows });
  return data.length === rows.to - rows.from ? data : sliceColumn(data, 0, rows.to - rows.from);
}
