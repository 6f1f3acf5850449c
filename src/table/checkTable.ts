import type { Column } from "../call/column.js";
import { type ColumnCheck, checkColumn } from "./checkColumn.js";

export interface TableColumn {
  readonly header: string;
  /** The cell of a row of units under the header, where the table has one. */
  readonly unitCell?: string;
  /** What the file says that the column means (IVOA UCD1+). */
  readonly ucd?: string | undefined;
  readonly column: Column;
}

/** What was understood of each column of a table, and what to look at. */
export function checkTable(columns: readonly TableColumn[]): readonly ColumnCheck[] {
  return withNeighbours(columns.map(({ header, unitCell, ucd, column }) => checkColumn(header, unitCell, column, ucd)));
}

/** Checks of columns side by side, with what only their neighbours show. */
export function withNeighbours(checks: readonly ColumnCheck[]): readonly ColumnCheck[] {
  return checks.map((check, index) => {
    const before = checks[index - 1]?.recognised;
    const stray =
      check.numbers > 0 &&
      check.recognised.isUncertainty &&
      !before?.quantity &&
      !before?.isUncertainty &&
      !before?.unit;
    return stray ? { ...check, findings: [...check.findings, { about: "uncertainty without value" }] } : check;
  });
}
