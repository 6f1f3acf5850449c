import type { BookDocument } from "../../../../files/bookFile/bookDocument.js";
import type { Book } from "../../../../sheet/book/book.js";

export interface FileToOpen {
  readonly name: string;
  /** [byte] */
  readonly size: number;
  /** The first bytes. */
  readonly start: Uint8Array;
  readonly content: Blob;
}

export interface OpenWatch {
  readonly signal: AbortSignal;
  /** Of the bytes of the file. */
  progress(done: number): void;
}

/** A book from a file, its formulas still to be calculated, and what its owner should know. */
export interface ReadFile {
  readonly document: BookDocument;
  /** The book with the values that the file says its formulas gave, where it says so. */
  readonly calculated?: Book;
  readonly findings: readonly string[];
}

/** One kind of file. */
export interface Opener {
  /** By what is in the file: names lie. */
  isFor(file: FileToOpen): boolean;
  /** A longer file is refused before it is read [byte]. */
  readonly longest: number;
  /** Throws a FileProblem for what it cannot read, the signal's reason when aborted. */
  read(file: FileToOpen, watch: OpenWatch): Promise<ReadFile>;
}
