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

/** All that a book file holds. */
export interface BookDocument {
  readonly title: string;
  readonly book: Book;
  readonly presentation: Presentation;
  readonly marks: readonly KeptMark[];
  /** What was done to the book, the latest last. */
  readonly history: readonly string[];
}
