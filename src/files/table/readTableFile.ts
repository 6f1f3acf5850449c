import type { ReadProgress } from "../delimited/readDelimited.js";
import type { TextSource } from "../text/textSource.js";
import { readWorkbook } from "../xlsx/readWorkbook.js";
import type { TableFile } from "./tableFile.js";
import { type TableFileHints, TableFileReading } from "./tableFileReading.js";
import { tableOfWorkbook } from "./tableOfWorkbook.js";

/** What a host may say and ask for while a file is read. */
export interface ReadTableFileOptions extends TableFileHints {
  readonly signal?: AbortSignal;
  /** Awaited after each piece, so that a host can give the screen its turn. */
  readonly progress?: (progress: ReadProgress) => void | Promise<void>;
}

const pieceLength = 1 << 18;

/**
 * Reads a table, whatever kind of file it stands in: the kind is found from the content. Rejects with a FileProblem for
 * what is no table, with the signal's reason when aborted. Text is read piece by piece and, but for delimited text, not
 * kept.
 */
export async function readTableFile(source: TextSource, options: ReadTableFileOptions = {}): Promise<TableFile> {
  const { signal } = options;
  const reading = new TableFileReading(options);
  signal?.throwIfAborted();
  for await (const chunk of typeof source === "string" ? piecesOf(source) : source) {
    signal?.throwIfAborted();
    reading.push(chunk);
    await options.progress?.({ rows: reading.rows, taken: reading.taken });
  }
  signal?.throwIfAborted();
  const bytes = reading.workbook();
  if (!bytes) return reading.finish();
  const workbook = await readWorkbook(bytes, { isCancelled: () => signal?.aborted ?? false });
  signal?.throwIfAborted();
  return tableOfWorkbook(workbook!, options.table);
}

function* piecesOf(text: string): Generator<string> {
  for (let at = 0; at < text.length; at += pieceLength) yield text.slice(at, at + pieceLength);
}
