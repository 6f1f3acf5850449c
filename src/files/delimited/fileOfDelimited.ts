import { readHeader } from "../../units/readHeader.js";
import type { TableFile } from "../table/tableFile.js";
import type { DelimitedTable } from "./delimitedTable.js";

/** A table of delimited text as a table file; its own text stays with it. */
export function fileOfDelimited(table: DelimitedTable): TableFile {
  return {
    format: "delimited",
    name: undefined,
    description: undefined,
    header: table.header,
    unitsRow: table.unitsRow,
    columns: table.columns,
    rows: table.rows,
    notes: table.header.map((header) => ({
      name: readHeader(header).name || header,
      unit: undefined,
      description: undefined,
      ucd: undefined,
    })),
    remarks: table.preamble.map((line) => line.replace(/^#\s*/, "")),
    findings: table.findings,
    delimited: table,
  };
}
