import type { Cell } from "../../../src/call/cell.js";
import { cellAt } from "../../../src/call/column.js";
import { FileProblem } from "../../../src/files/fileProblem.js";
import type { TableFile } from "../../../src/files/table/tableFile.js";
import { type TableFileHints, TableFileReading } from "../../../src/files/table/tableFileReading.js";
import { sentenceOfTableFinding } from "../../../src/files/table/tableFinding.js";

export function read(source: string | Uint8Array, options: TableFileHints = {}): TableFile {
  return readPieces([source], options);
}

export function readPieces(pieces: Iterable<string | Uint8Array>, hints: TableFileHints = {}): TableFile {
  const reading = new TableFileReading(hints);
  for (const piece of pieces) reading.push(piece);
  return reading.finish();
}

/** The rows of a table, cell by cell. */
export function rowsOf(table: Pick<TableFile, "rows" | "columns">): Cell[][] {
  return Array.from({ length: table.rows }, (_, row) => table.columns.map((column) => cellAt(column, row)));
}

export function sentencesOf({ findings }: TableFile): string[] {
  return findings.map(sentenceOfTableFinding);
}

/** Why a file is refused. */
export function refusal(source: string | Uint8Array, options: TableFileHints = {}): string {
  try {
    read(source, options);
  } catch (problem) {
    if (problem instanceof FileProblem) return problem.message;
    throw problem;
  }
  throw new Error("the file was read");
}
