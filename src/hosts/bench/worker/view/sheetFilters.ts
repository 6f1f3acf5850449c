import type { Book, Sheet } from "../../../../sheet/book/book.js";
import { readCell } from "../../../../sheet/book/cells.js";
import { filterRows } from "../../../../sheet/view/filterRows.js";
import { recogniseColumn } from "../../../../table/recogniseColumn.js";
import type { FilterCondition } from "../../protocol/request.js";
import { columnName, headerText } from "../actions/words.js";
import type { SheetFilter } from "../session.js";
import { sheetSize } from "../state/sheetSize.js";
import { cellTest } from "./cellTest.js";

/** The rows of a sheet that meet all conditions, and its header row. Throws EditRefused for one that means nothing. */
export function filterSheet(
  book: Book,
  sheet: number,
  conditions: readonly FilterCondition[],
  among?: Int32Array,
): SheetFilter | undefined {
  const found = book.sheets[sheet];
  if ((conditions.length === 0 && among === undefined) || found === undefined) return undefined;
  const filters = conditions.map((condition) => {
    const { column } = condition;
    const unit = recogniseColumn(headerText(book, sheet, column)).unit;
    return { column, keeps: cellTest(condition, columnName(book, sheet, column), unit) };
  });
  const { rows: end, columns } = sheetSize(found);
  const met =
    end > 1
      ? filterRows(book, { sheet, top: 1, left: 0, bottom: end - 1, right: columns }, filters)
      : new Int32Array(0);
  const chosen = among && new Set(among);
  const kept = chosen ? met.filter((row) => chosen.has(row)) : met;
  const rows = new Int32Array(kept.length + 1);
  rows.set(kept, 1);
  return { sheet: found.name, conditions, among, rows, end: Math.max(1, end), of: book };
}

/**
 * The filters of a book for another version of it: conditions follow their columns, rows are looked through anew. Rows
 * chosen by hand are forgotten where cells were `moved`.
 */
export function followFilters(
  filters: readonly (SheetFilter | undefined)[],
  book: Book,
  moved: boolean,
): readonly (SheetFilter | undefined)[] {
  if (filters.every((filter) => filter === undefined)) return [];
  const followed: (SheetFilter | undefined)[] = [];
  for (const [index, filter] of filters.entries()) {
    if (filter === undefined) continue;
    if (filter.of === book) {
      followed[index] = filter;
      continue;
    }
    const named = book.sheets.findIndex(({ name }) => name === filter.sheet);
    const sheet = named < 0 && book.sheets.length === filter.of.sheets.length ? index : named;
    const before = filter.of.sheets[index];
    const after = book.sheets[sheet];
    if (before !== undefined && after !== undefined) {
      const conditions = filter.conditions.flatMap((condition) => {
        const column = followedColumn(before, after, condition.column);
        return column === undefined ? [] : [{ ...condition, column }];
      });
      followed[sheet] = attempted(book, sheet, conditions, moved ? undefined : filter.among);
    }
  }
  return followed;
}

/** A condition may mean nothing any more, where the column has another unit now: then all rows are seen again. */
function attempted(
  book: Book,
  sheet: number,
  conditions: readonly FilterCondition[],
  among: Int32Array | undefined,
): SheetFilter | undefined {
  try {
    return filterSheet(book, sheet, conditions, among);
  } catch {
    return undefined;
  }
}

/** Where a column is now: the very same one, else the one with its header, else the one in its place. */
function followedColumn(before: Sheet, after: Sheet, column: number): number | undefined {
  const own = before.columns[column];
  const same = own === undefined ? -1 : after.columns.indexOf(own);
  if (same >= 0) return same;
  const header = headerOf(before, column);
  if (headerOf(after, column) === header) return column;
  const elsewhere = after.columns.findIndex((_, index) => header !== null && headerOf(after, index) === header);
  if (elsewhere >= 0) return elsewhere;
  return sheetSize(before).columns === sheetSize(after).columns ? column : undefined;
}

function headerOf(sheet: Sheet, column: number) {
  const cells = sheet.columns[column]?.cells;
  return cells === undefined ? null : readCell(cells, 0);
}
