import { calculateAll } from "../../../../files/bookFile/calculateAll.js";
import { type BookTable, bookTable, tableCells } from "../../../../revision/bookTable.js";
import type { RevisionTable } from "../../../../revision/pairRevision.js";
import { sha256 } from "../../../../revision/sha256.js";
import { changeInSlices } from "../../../../sheet/change.js";
import type { OpenedWatch } from "../books/openingWatch.js";
import { loadFileMethods } from "../files/loadFileMethods.js";
import { notesName } from "../files/notesSheet.js";
import { functions } from "../functions.js";

export interface RevisionFile {
  readonly name: string;
  readonly sha256: string;
  /** Its sheets that hold tables. */
  readonly tables: readonly { readonly name: string; readonly table: RevisionTable }[];
  /** What to know of how it was read. */
  readonly findings: readonly string[];
}

/** Reads any file that can be opened, for the tables in it. Throws a FileProblem; undefined where it was stopped. */
export async function readRevisionFile(file: File, watch: OpenedWatch): Promise<RevisionFile | undefined> {
  const { openFile } = await loadFileMethods();
  const progress = (done: number) => watch.onProgress(done, file.size);
  const { document, calculated, findings } = await openFile(file.name, file, { signal: watch.signal, progress });
  const book = calculated ?? (await changeInSlices(document.book, [calculateAll(document.book)], functions, watch));
  if (book === undefined) return undefined;
  const digest = await digestOf(file, watch.signal);
  const tables = book.sheets.flatMap(({ name }, sheet) => {
    const table = bookTable(book, sheet);
    return table && (name !== notesName || sheet === 0) ? [{ name, table: revisionOf(table) }] : [];
  });
  // What the columns mean is told of where it stands in a sheet, and no sheet is made here.
  return { name: file.name, sha256: digest, tables, findings: findings.filter((text) => !text.includes(notesName)) };
}

function revisionOf(table: BookTable): RevisionTable {
  const { columns, rows } = table;
  return {
    header: columns.map(({ header }) => header),
    unitsRow: undefined,
    columns: columns.map(({ column }) => tableCells(table, column)),
    rows,
    notes: columns.map(({ header }) => ({ name: header, unit: undefined, description: undefined, ucd: undefined })),
  };
}

async function digestOf(file: Blob, signal: AbortSignal): Promise<string> {
  const digest = sha256();
  const pieces = file.stream().getReader();
  try {
    for (let read = await pieces.read(); !read.done; read = await pieces.read()) {
      signal.throwIfAborted();
      digest.push(read.value);
    }
  } finally {
    await pieces.cancel();
  }
  return digest.finish();
}
