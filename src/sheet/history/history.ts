import type { Book } from "../book/book.js";

/** A book as it was after an edit, and what the edit was: "filled K down 100,000 rows". */
export interface Version {
  readonly name: string;
  readonly book: Book;
}

/** All versions of a book, the present one by its index. Versions share what did not change. */
export interface History {
  readonly versions: readonly Version[];
  readonly present: number;
}

export function startHistory(book: Book, name = "opened"): History {
  return { versions: [{ name, book }], present: 0 };
}

/** A new version after the present one; versions that were undone are dropped. */
export function record(history: History, name: string, book: Book): History {
  const versions = [...history.versions.slice(0, history.present + 1), { name, book }];
  return { versions, present: versions.length - 1 };
}

export function undo(history: History): History {
  return goTo(history, history.present - 1);
}

export function redo(history: History): History {
  return goTo(history, history.present + 1);
}

/** The same history at another version; an index outside stays at the nearest end. */
export function goTo(history: History, index: number): History {
  return { ...history, present: Math.min(history.versions.length - 1, Math.max(0, index)) };
}

export function presentBook({ versions, present }: History): Book {
  return (versions[present] as Version).book;
}
