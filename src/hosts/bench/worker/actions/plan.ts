import type { Area, Book } from "../../../../sheet/book/book.js";
import type { Edit } from "../../../../sheet/edit/draft.js";
import type { Presentation } from "../../../../sheet/presentation/presentation.js";
import type { BookLedger } from "../session.js";

/** What an action comes to: edits of the book, another way of seeing it, and what it is called in the history. */
export interface Plan {
  readonly name: string;
  readonly edits: readonly Edit[];
  /** Undefined where it stays. */
  readonly presentation?: Presentation;
  /** The cells it writes itself. */
  readonly edited: readonly Area[];
  /** Cells stand elsewhere afterwards. */
  readonly moved?: true;
  /** What came of a revision, from the book before and after. */
  readonly ledger?: (before: Book, after: Book) => BookLedger;
  readonly select?: Area;
  readonly said?: string;
}
