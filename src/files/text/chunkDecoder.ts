import { FileProblem } from "../fileProblem.js";
import { firstIllFormedByte } from "./firstIllFormedByte.js";
import type { TextChunk, TextEncoding } from "./textSource.js";

const advice = "save the table as text (CSV or TSV, UTF-8) and open that file";

/**
 * Turns the pieces of one file into text. A byte order mark stays in the text as U+FEFF. Throws a FileProblem that
 * names the place where the file stops being text.
 */
export class ChunkDecoder {
  encoding: TextEncoding = "utf-8";
  /** Bytes taken, or characters where the pieces are text already. */
  taken = 0;
  private decoder: TextDecoder | undefined;
  private opening = new Uint8Array();
  private tail = new Uint8Array();

  push(chunk: TextChunk): string {
    if (typeof chunk === "string") {
      refuseNul(chunk, (offset) => `character ${this.taken + offset + 1}`);
      this.taken += chunk.length;
      return chunk;
    }
    if (this.decoder !== undefined) {
      return this.decode(chunk, true);
    }
    this.opening = joined(this.opening, chunk);
    return this.opening.length < 2 ? "" : this.begin(true);
  }

  end(): string {
    if (this.decoder !== undefined) {
      return this.decode(new Uint8Array(), false);
    }
    return this.opening.length === 0 ? "" : this.begin(false);
  }

  private begin(stream: boolean): string {
    const [first, second] = this.opening;
    if (first === 0xff && second === 0xfe) {
      this.encoding = "utf-16le";
    } else if (first === 0xfe && second === 0xff) {
      this.encoding = "utf-16be";
    }
    this.decoder = new TextDecoder(this.encoding, { fatal: true, ignoreBOM: true });
    return this.decode(this.opening, stream);
  }

  private decode(bytes: Uint8Array, stream: boolean): string {
    const text = this.decodeOrExplain(bytes, stream);
    const width = this.encoding === "utf-8" ? undefined : 2;
    refuseNul(text, (offset) => `byte ${this.taken + (width === undefined ? bytes.indexOf(0) : offset * width)}`);
    this.taken += bytes.length;
    this.tail = joined(this.tail, bytes.subarray(-3)).slice(-3);
    return text;
  }

  private decodeOrExplain(bytes: Uint8Array, stream: boolean): string {
    try {
      return (this.decoder as TextDecoder).decode(bytes, { stream });
    } catch {
      if (this.encoding !== "utf-8") {
        const place = `between bytes ${this.taken} and ${this.taken + bytes.length}`;
        throw new FileProblem("not-utf-16", `The file begins as UTF-16 text but is none ${place}; ${advice}.`);
      }
      const offset = this.taken - this.tail.length + firstIllFormedByte(joined(this.tail, bytes), this.tail.length);
      throw new FileProblem(
        "not-utf-8",
        `The file is not UTF-8 text: byte ${offset} belongs to no character. It is in another encoding or not a text file; ${advice}.`,
      );
    }
  }
}

function refuseNul(text: string, place: (offset: number) => string): void {
  const offset = text.indexOf("\0");
  if (offset >= 0) {
    throw new FileProblem("binary", `The file is not text: ${place(offset)} is zero, as in a binary file; ${advice}.`);
  }
}

function joined(first: Uint8Array, second: Uint8Array): Uint8Array<ArrayBuffer> {
  const both = new Uint8Array(first.length + second.length);
  both.set(first);
  both.set(second, first.length);
  return both;
}
