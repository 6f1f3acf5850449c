import type { Column } from "../../call/column.js";
import type { DelimitedTable } from "../delimited/delimitedTable.js";
import type { TableFinding } from "./tableFinding.js";

/** The kinds of file that tables are read from. */
export type TableFormat = "delimited" | "ecsv" | "votable" | "machine-readable" | "ipac" | "fixed-width" | "workbook";

/** What a file says of a column beside its header; undefined where it says nothing. */
export interface ColumnNotes {
  /** As the file has it: the header may add a unit, or the word that marks an uncertainty. */
  readonly name: string;
  /** As the file writes it. */
  readonly unit: string | undefined;
  readonly description: string | undefined;
  /** Unified Content Descriptor (IVOA UCD1+): what the column means, in words of a standard list. */
  readonly ucd: string | undefined;
}

/** A table as it was read, whatever kind of file it came from. */
export interface TableFile {
  readonly format: TableFormat;
  readonly name: string | undefined;
  readonly description: string | undefined;
  /** One text a column, with its unit in square brackets where the file states one: `Period [d]`. */
  readonly header: readonly string[];
  /** The row of units under the header; only delimited and fixed-width text can have one. */
  readonly unitsRow: readonly string[] | undefined;
  readonly columns: readonly Column[];
  readonly rows: number;
  /** One a column. */
  readonly notes: readonly ColumnNotes[];
  /** Comments and notes on the table as a whole. */
  readonly remarks: readonly string[];
  readonly findings: readonly TableFinding[];
  /** The table with its own text, where it came as delimited text; columns can be appended to that. */
  readonly delimited: DelimitedTable | undefined;
}
