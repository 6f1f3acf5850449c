import { isProblem } from "../../units/problem.js";
import { readUnit } from "../../units/readUnit.js";
import { type DelimitedOptions, DelimitedReader } from "../delimited/delimitedReader.js";
import { fileOfDelimited } from "../delimited/fileOfDelimited.js";
import { EcsvReader } from "../ecsv/ecsvReader.js";
import { FixedWidthReader } from "../fixedWidth/fixedWidthReader.js";
import { IpacReader } from "../ipac/ipacReader.js";
import { MachineReadableReader } from "../machineReadable/machineReadableReader.js";
import { isPacked, refuseOtherKinds, signatureLength } from "../otherKinds.js";
import { ChunkDecoder } from "../text/chunkDecoder.js";
import type { TextChunk } from "../text/textSource.js";
import { VotableReader } from "../votable/votableReader.js";
import { detectFormat, openingLength } from "./detectFormat.js";
import type { TableFile, TableFormat } from "./tableFile.js";
import type { TableReader } from "./tableReader.js";

/** What a host may say of a file; left out, everything is found from the content. */
export interface TableFileHints extends Partial<DelimitedOptions> {
  /** Which table of several: its name, or its number from 1. The first where left out. */
  readonly table?: string;
}

/**
 * A table file that is read as its pieces arrive. What the first bytes decide waits for them, what the first text
 * decides for that; then one reader gets the rest. The bytes of a workbook are kept whole, for it can only be read so.
 */
export class TableFileReading {
  private readonly decoder = new ChunkDecoder();
  private signature: Uint8Array | undefined = new Uint8Array();
  private held: Uint8Array[] = [];
  private isWorkbook = false;
  private opening = "";
  private reader: TableReader | undefined;

  constructor(private readonly hints: TableFileHints = {}) {}

  get rows(): number {
    return this.reader?.rows ?? 0;
  }

  /** Bytes taken, or characters where the file came as text. */
  get taken(): number {
    return this.decoder.taken + this.held.reduce((sum, { length }) => sum + length, 0);
  }

  /** The bytes of a workbook; undefined for a file of any other kind. Asked when the file has ended. */
  workbook(): Uint8Array | undefined {
    this.decide(true);
    if (!this.isWorkbook) return undefined;
    const bytes = new Uint8Array(this.taken);
    let at = 0;
    for (const piece of this.held) {
      bytes.set(piece, at);
      at += piece.length;
    }
    this.held = [];
    return bytes;
  }

  push(chunk: TextChunk): void {
    if (typeof chunk === "string") {
      this.pushText(this.decoder.push(chunk));
      return;
    }
    if (this.isWorkbook || this.signature) this.held.push(chunk);
    else this.pushText(this.decoder.push(chunk));
    if (this.signature) {
      this.signature = Uint8Array.of(...this.signature, ...chunk.subarray(0, signatureLength));
      this.decide(false);
    }
  }

  /** The table of a file that is no workbook. */
  finish(): TableFile {
    this.decide(true);
    this.pushText(this.decoder.end());
    return this.begin().finish(this.decoder.encoding);
  }

  private decide(last: boolean): void {
    if (!this.signature || (this.signature.length < signatureLength && !last)) return;
    refuseOtherKinds(this.signature);
    this.isWorkbook = isPacked(this.signature);
    this.signature = undefined;
    if (this.isWorkbook) return;
    const { held } = this;
    this.held = [];
    for (const piece of held) this.pushText(this.decoder.push(piece));
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
      this.reader = readerOf(format, this.hints);
      // Delimited text tells of its byte order mark; to the other kinds it means nothing.
      this.reader.push(format === "delimited" ? this.opening : this.opening.replace(/^\uFEFF/, ""));
      this.opening = "";
    }
    return this.reader;
  }
}

function readerOf(format: Exclude<TableFormat, "workbook">, hints: TableFileHints): TableReader {
  const isUnit = hints.isUnit ?? ((text: string) => !isProblem(readUnit(text)));
  switch (format) {
    case "ecsv":
      return new EcsvReader();
    case "votable":
      return new VotableReader(hints.table);
    case "machine-readable":
      return new MachineReadableReader();
    case "ipac":
      return new IpacReader();
    case "fixed-width":
      return new FixedWidthReader(isUnit);
    case "delimited":
      return delimitedReader({ ...hints, isUnit });
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
