import { readFile } from "node:fs/promises";
import { FileProblem } from "../../files/fileProblem.js";
import { readWorkbookAsStored } from "../../files/xlsx/readWorkbook.js";
import type { Workbook } from "../../sheet/display/workbook.js";
import { IoProblem, ioProblem } from "./ioProblem.js";
import type { Terminal } from "./terminal.js";

/** Reads a workbook from a file, or from standard input for "-", with the values that it holds. */
export async function readBook(path: string, terminal: Terminal): Promise<Workbook> {
  try {
    return await readWorkbookAsStored(path === "-" ? await readAll(terminal) : await readFile(path));
  } catch (error) {
    if (error instanceof FileProblem) throw new IoProblem(`${path}: ${error.message}`);
    if ((error as { syscall?: string }).syscall !== undefined) throw ioProblem("read", path, error);
    throw error;
  }
}

async function readAll(terminal: Terminal): Promise<Uint8Array> {
  const pieces: Uint8Array[] = [];
  for await (const piece of terminal.input) pieces.push(piece);
  return Buffer.concat(pieces);
}
