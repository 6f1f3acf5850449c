import { type DelimitedTable, recordOfRow } from "./delimitedTable.js";
import { placeOfRecord } from "./sourceText.js";

/** The text of a data row as it stood in its file, without line ending. */
export function recordText(table: DelimitedTable, row: number): string {
  const { block, start, end } = placeOfRecord(table.source, recordOfRow(table, row));
  return (table.source.blocks[block] as string).slice(start, end);
}
