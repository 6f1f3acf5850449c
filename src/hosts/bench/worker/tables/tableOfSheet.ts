import type { Book } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { readColumn } from "../../../../sheet/book/readColumn.js";
import type { PlannedColumn, TablePlan } from "../../../../table/tableOf.js";
import { tableOf } from "../../../../table/tableOf.js";
import type { ColumnState } from "../../protocol/bookState.js";
import { headerText } from "../actions/words.js";
import { columnStatesOf } from "../state/columnStates.js";
import { sheetSize } from "../state/sheetSize.js";

/** Rows that are looked at to find a row of units under the headers. */
const rowsAbove = 3;

/**
 * The table of a sheet, its headers in the first row; columns without a header are left out, but for the uncertainties
 * that the formulas of a column put beside it.
 */
export function tableOfSheet(book: Book, sheet: number): TablePlan {
  const { rows: used, columns: width } = sheetSize(book.sheets[sheet]!);
  const top = Array.from({ length: Math.min(used, rowsAbove) }, (_, row) =>
    Array.from({ length: width }, (_, column) => cellOf(book, { sheet, row, column })),
  );
  const found = tableOf(top);
  const unitRow = found?.headerRow === 0 ? found.unitRow : undefined;
  const firstRow = (unitRow ?? 0) + 1;
  const rows = Math.max(0, used - firstRow);
  const known = columnStatesOf(book, sheet);
  const columns = Array.from({ length: width }, (_, index): PlannedColumn[] => {
    const header = headerText(book, sheet, index) || spilledHeader(known, index);
    if (header.trim() === "") return [];
    const unit = unitRow === undefined ? null : cellOf(book, { sheet, row: unitRow, column: index });
    const states = typeof unit === "string" && unit.trim() !== "" && unit !== "-";
    const column = readColumn(book, { sheet, column: index, from: firstRow, to: firstRow + rows });
    return [{ index, header, ...(states ? { unitCell: unit } : {}), column }];
  }).flat();
  return { headerRow: 0, unitRow, firstRow, rows, columns };
}

/** The header that a column of uncertainties without one would have, where its value has no other such column. */
function spilledHeader(states: readonly ColumnState[], index: number): string {
  const value = states[index]?.derived ? states[states[index].sigmaOf ?? -1] : undefined;
  if (value === undefined || value.name === "" || value.sigmasTo !== index || states[index]?.sigmaOf !== index - 1) {
    return "";
  }
  return `${value.name} sigma${value.unit === "" ? "" : ` [${value.unit}]`}`;
}
