import type { Column } from "../../call/column.js";
import type { Dialect } from "./dialect.js";
import type { Finding } from "./finding.js";
import type { SourceText } from "./sourceText.js";

/** A table read from delimited text, together with the text itself: nothing of a file is lost by reading it. */
export interface DelimitedTable {
  /** One name a column, without surrounding blanks; empty for columns that only longer rows have. */
  readonly header: readonly string[];
  /** One text a column, without surrounding blanks; undefined where no row of units stands under the header. */
  readonly unitsRow: readonly string[] | undefined;
  /** The data rows, as many columns as the header or the longest row has; cells a shorter row lacks are blank. */
  readonly columns: readonly Column[];
  readonly rows: number;
  /** The comment lines before the header as they stood, without line endings; asidesOf gives all of them. */
  readonly preamble: readonly string[];
  readonly dialect: Dialect;
  readonly findings: readonly Finding[];
  readonly source: SourceText;
}

/** The number of a data row among the records of its file, where header and units row come first. */
export function recordOfRow(table: DelimitedTable, row: number): number {
  return row + (table.unitsRow === undefined ? 1 : 2);
}
