import type { Column } from "../../call/column.js";
import type { FieldColumn } from "./fieldColumn.js";
import { headerKeepsUnit, headerOfField } from "./headerOfField.js";
import { sameNames } from "./sameNames.js";
import type { ColumnNotes } from "./tableFile.js";
import type { TableFinding } from "./tableFinding.js";

/** A column as a file describes it, with the cells read so far. */
export interface DescribedColumn {
  readonly notes: ColumnNotes;
  readonly cells: FieldColumn;
}

/** The parts of a table file that its described columns make up. */
export interface DescribedColumns {
  readonly header: readonly string[];
  readonly columns: readonly Column[];
  readonly notes: readonly ColumnNotes[];
  readonly findings: readonly TableFinding[];
}

export function describedColumns(described: readonly DescribedColumn[]): DescribedColumns {
  const notes = described.map((column) => column.notes);
  const header = notes.map(headerOfField);
  const unitsAside = notes
    .filter((own, index) => !headerKeepsUnit(header[index]!, own))
    .map(({ name, unit = "" }): TableFinding => ({ kind: "unit-aside", name, unit }));
  return {
    header,
    columns: described.map(({ cells }) => cells.finish()),
    notes,
    findings: [...sameNames(header), ...unitsAside],
  };
}
