import { ChunkDecoder } from "../text/chunkDecoder.js";
import type { TextChunk, TextSource } from "../text/textSource.js";
import { type DelimitedOptions, DelimitedReader } from "./delimitedReader.js";
import type { DelimitedTable } from "./delimitedTable.js";

export interface ReadProgress {
  readonly rows: number;
  /** Bytes of the file read so far, or characters where it came as text. */
  readonly taken: number;
}

export interface ReadDelimitedOptions extends DelimitedOptions {
  readonly signal?: AbortSignal;
  /** Awaited after each piece, so that a host can give the screen its turn. */
  readonly progress?: (progress: ReadProgress) => void | Promise<void>;
}

const pieceLength = 1 << 18;

/** Reads delimited text. Rejects with a FileProblem for what is no table, with the signal's reason when aborted. */
export async function readDelimited(source: TextSource, options: ReadDelimitedOptions): Promise<DelimitedTable> {
  const decoder = new ChunkDecoder();
  const reader = new DelimitedReader(options);
  options.signal?.throwIfAborted();
  for await (const chunk of typeof source === "string" ? piecesOf(source) : source) {
    options.signal?.throwIfAborted();
    reader.push(decoder.push(chunk));
    await options.progress?.({ rows: reader.rows, taken: decoder.taken });
  }
  options.signal?.throwIfAborted();
  reader.push(decoder.end());
  return reader.finish(decoder.encoding);
}

/** The same at one go, for text that is at hand. */
export function readDelimitedText(source: string | Iterable<TextChunk>, options: DelimitedOptions): DelimitedTable {
  const decoder = new ChunkDecoder();
  const reader = new DelimitedReader(options);
  for (const chunk of typeof source === "string" ? piecesOf(source) : source) {
    reader.push(decoder.push(chunk));
  }
  reader.push(decoder.end());
  return reader.finish(decoder.encoding);
}

function* piecesOf(text: string): Generator<string> {
  for (let at = 0; at < text.length; at += pieceLength) {
    yield text.slice(at, at + pieceLength);
  }
}
