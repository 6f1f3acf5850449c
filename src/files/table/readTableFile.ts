import { isProblem } from "../../units/problem.js";
import { readUnit } from "../../units/readUnit.js";
import { type DelimitedOptions, DelimitedReader } from "../delimited/delimitedReader.js";
import { fileOfDelimited } from "../delimited/fileOfDelimited.js";
import type { ReadProgress } from "../delimited/readDelimited.js";
import { EcsvReader } from "../ecsv/ecsvReader.js";
import { FixedWidthReader } from "../fixedWidth/fixedWidthReader.js";
import { IpacReader } from "../ipac/ipacReader.js";
import { MachineReadableReader } from "../machineReadable/machineReadableReader.js";
import { ChunkDecoder } from "../text/chunkDecoder.js";
import type { TextChunk, TextSource } from "../text/textSource.js";
import { VotableReader } from "../votable/votableReader.js";
import { detectFormat, detectSignature, openingLength, signatureLength } from "./detectFormat.js";
import type { TableFile, TableFormat } from "./tableFile.js";
import type { TableReader } from "./tableReader.js";

/** What a host may say and ask for while a file is read; left out, everything is found from the file. */
export interface ReadTableFileOptions extends Partial<DelimitedOptions> {
  /** Which table of several: its name, or its number from 1. The first where left out. */
  readonly table?: string;
  readonly signal?: AbortSignal;
  /** Awaited after each piece, so that a host can give the screen its turn. */
  readonly progress?: (progress: ReadProgress) => void | Promise<void>;
}

const pieceLength = 1 << 18;

/**
 * Reads a table, whatever kind of file it stands in: the kind is found from the content. Rejects with a FileProblem for
 * what is no table, with the signal's reason when aborted. The text is read piece by piece and, but for delimited text,
 * not kept.
 */
export async function readTableFile(source: TextSource, options: ReadTableFileOptions = {}): Promise<TableFile> {
  const reading = new TableFileReading(options);
  options.signal?.throwIfAborted();
  for await (const chunk of typeof source === "string" ? piecesOf(source) : source) {
    options.signal?.throwIfAborted();
    reading.push(chunk);
    await options.progress?.({ rows: reading.rows, taken: reading.taken });
  }
  options.signal?.throwIfAborted();
  return reading.finish();
}

/** The same at one go, for a file that is at hand. */
export function readTableFileNow(source: string | Iterable<TextChunk>, options: ReadTableFileOptions = {}): TableFile {
  const reading = new TableFileReading(options);
  for (const chunk of typeof source === "string" ? piecesOf(source) : source) reading.push(chunk);
  return reading.finish();
}

class TableFileReading {
  private readonly decoder = new ChunkDecoder();
  private signature: Uint8Array | undefined = new Uint8Array();
  private opening = "";
  private reader: TableReader | undefined;

  constructor(private readonly options: ReadTableFileOptions) {}

  get rows(): number {
    return this.reader?.rows ?? 0;
  }

  get taken(): number {
    return this.decoder.taken;
  }

  push(chunk: TextChunk): void {
    if (typeof chunk !== "string" && this.signature) {
      this.signature = Uint8Array.of(...this.signature, ...chunk.subarray(0, signatureLength));
      detectSignature(this.signature);
      if (this.signature.length >= signatureLength) this.signature = undefined;
    }
    this.pushText(this.decoder.push(chunk));
  }

  finish(): TableFile {
    this.pushText(this.decoder.end());
    return this.begin().finish(this.decoder.encoding);
  }

  private pushText(text: string): void {
    if (this.reader) {
      this.reader.push(text);
      return;
    }
    this.opening += text;
    if (this.opening.length >= openingLength) this.begin();
  }

  private begin(): TableReader {
    if (!this.reader) {
      const format = detectFormat(this.opening);
      this.reader = readerOf(format, this.options);
      // Delimited text tells of its byte order mark; to the other kinds it means nothing.
      this.reader.push(format === "delimited" ? this.opening : this.opening.replace(/^\uFEFF/, ""));
      this.opening = "";
    }
    return this.reader;
  }
}

function readerOf(format: Exclude<TableFormat, "workbook">, options: ReadTableFileOptions): TableReader {
  const isUnit = options.isUnit ?? ((text: string) => !isProblem(readUnit(text)));
  switch (format) {
    case "ecsv":
      return new EcsvReader();
    case "votable":
      return new VotableReader(options.table);
    case "machine-readable":
      return new MachineReadableReader();
    case "ipac":
      return new IpacReader();
    case "fixed-width":
      return new FixedWidthReader(isUnit);
    case "delimited":
      return delimitedReader({ ...options, isUnit });
  }
}

function delimitedReader(options: DelimitedOptions): TableReader {
  const reader = new DelimitedReader(options);
  return {
    get rows() {
      return reader.rows;
    },
    push: (text) => reader.push(text),
    finish: (encoding) => fileOfDelimited(reader.finish(encoding)),
  };
}

function* piecesOf(text: string): Generator<string> {
  for (let at = 0; at < text.length; at += pieceLength) yield text.slice(at, at + pieceLength);
}
