import type { Book } from "../book/book.js";

/** A book as it was after an edit, and what the edit was: "filled K down 100,000 rows". Hosts keep more with it. */
export interface Version {
  readonly name: string;
  readonly book: Book;
}

/** All versions of a book, the present one by its index. Versions share what did not change. */
export interface History<V extends Version = Version> {
  readonly versions: readonly V[];
  readonly present: number;
}

export function startHistory(book: Book, name = "opened"): History {
  return { versions: [{ name, book }], present: 0 };
}

/** A new version after the present one; versions that were undone are dropped. */
export function record(history: History, name: string, book: Book): History {
  return recordVersion(history, { name, book });
}

export function recordVersion<V extends Version>(history: History<V>, version: V): History<V> {
  const versions = [...history.versions.slice(0, history.present + 1), version];
  return { versions, present: versions.length - 1 };
}

export function undo<V extends Version>(history: History<V>): History<V> {
  return goTo(history, history.present - 1);
}

export function redo<V extends Version>(history: History<V>): History<V> {
  return goTo(history, history.present + 1);
}

/** The same history at another version; an index outside stays at the nearest end. */
export function goTo<V extends Version>(history: History<V>, index: number): History<V> {
  return { ...history, present: Math.min(history.versions.length - 1, Math.max(0, index)) };
}

export function presentVersion<V extends Version>({ versions, present }: History<V>): V {
  return versions[present] as V;
}

export function presentBook(history: History): Book {
  return presentVersion(history).book;
}
