import type { Cell } from "../../../src/call/cell.js";
import { cellAt } from "../../../src/call/column.js";
import { FileProblem } from "../../../src/files/fileProblem.js";
import { type ReadTableFileOptions, readTableFileNow } from "../../../src/files/table/readTableFile.js";
import type { TableFile } from "../../../src/files/table/tableFile.js";
import { sentenceOfTableFinding } from "../../../src/files/table/tableFinding.js";

export function read(source: string | Uint8Array, options: ReadTableFileOptions = {}): TableFile {
  return readTableFileNow(typeof source === "string" ? source : [source], options);
}

/** The rows of a table, cell by cell. */
export function rowsOf(table: Pick<TableFile, "rows" | "columns">): Cell[][] {
  return Array.from({ length: table.rows }, (_, row) => table.columns.map((column) => cellAt(column, row)));
}

export function sentencesOf({ findings }: TableFile): string[] {
  return findings.map(sentenceOfTableFinding);
}

/** Why a file is refused. */
export function refusal(source: string | Uint8Array, options: ReadTableFileOptions = {}): string {
  try {
    read(source, options);
  } catch (problem) {
    if (problem instanceof FileProblem) return problem.message;
    throw problem;
  }
  throw new Error("the file was read");
}
