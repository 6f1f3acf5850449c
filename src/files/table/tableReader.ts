import type { TextEncoding } from "../text/textSource.js";
import type { TableFile } from "./tableFile.js";

/** Reads one table from text that arrives in pieces. Throws a FileProblem where it is none. */
export interface TableReader {
  readonly rows: number;
  push(text: string): void;
  finish(encoding: TextEncoding): TableFile;
}
