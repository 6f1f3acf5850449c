import type { Area } from "../../../../sheet/book/book.js";
import type { Edit } from "../../../../sheet/edit/draft.js";
import type { Presentation } from "../../../../sheet/presentation/presentation.js";

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
  readonly select?: Area;
  readonly said?: string;
}
