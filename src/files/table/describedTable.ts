import type { Column } from "../../call/column.js";
import type { ColumnNotes } from "./tableFile.js";

/** A table to be written to a file that describes its columns; a table that was read is one. */
export interface DescribedTable {
  /** One text a column, with its unit in square brackets. */
  readonly header: readonly string[];
  readonly unitsRow?: readonly string[] | undefined;
  readonly columns: readonly Column[];
  readonly notes?: readonly (ColumnNotes | undefined)[] | undefined;
  readonly name?: string | undefined;
  readonly description?: string | undefined;
  readonly remarks?: readonly string[] | undefined;
}
