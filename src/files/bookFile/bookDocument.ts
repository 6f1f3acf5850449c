import type { Book } from "../../sheet/book/book.js";
import type { Presentation } from "../../sheet/presentation/presentation.js";
import type { ComparedTable } from "../../table/compareTables.js";

/** The derived values of a sheet as they stood at one moment. */
export interface KeptMark {
  readonly id: string;
  readonly name: string;
  /** Milliseconds since 1970. */
  readonly at: number;
  /** Name of the sheet. */
  readonly sheet: string;
  readonly table: ComparedTable;
}

/** What the revisions of a book's tables are asked with, and the ledgers that they left. */
export interface KeptRevisions {
  /** As typed: a line for each, `old = new`. */
  readonly aliases: string;
  /** As typed: a line for each, `K >= 1 m/s`. */
  readonly conditions: string;
  /** The latest first. */
  readonly ledgers: readonly KeptLedger[];
}

/** A ledger in plain JSON; what is in it is for those to check who read it. */
export interface KeptLedger {
  readonly kind: "barycell-ledger";
  readonly version: number;
  readonly entries: readonly object[];
}

/** All that a book file holds. */
export interface BookDocument {
  readonly title: string;
  readonly book: Book;
  readonly presentation: Presentation;
  readonly marks: readonly KeptMark[];
  /** Undefined where none was asked for. */
  readonly revisions?: KeptRevisions | undefined;
  /** What was done to the book, the latest last. */
  readonly history: readonly string[];
}
