import type { BookEntry, KeptDraft } from "../../protocol/answers.js";
import { type Database, partsOf } from "./database.js";

/** Removed books are swept away when the page starts, once they have been gone so long [ms]. */
const keptRemoved = 24 * 3600 * 1000;

/** The books in the browser's storage, the last changed first. */
export async function listBooks(database: Database): Promise<BookEntry[]> {
  const records = (await database.getAll("books")).filter(({ removed }) => removed === undefined);
  records.sort((a, b) => b.changed - a.changed);
  return records.map(({ id, title, changed, rows }) => ({ id, title, changed, rows }));
}

/** Takes a book off the shelf; it can be put back. */
export async function setRemoved(database: Database, id: string, removed: number | undefined): Promise<boolean> {
  const transaction = database.transaction("books", "readwrite");
  const record = await transaction.store.get(id);
  if (record) await transaction.store.put({ ...record, removed });
  await transaction.done;
  return record !== undefined;
}

export async function renameStored(database: Database, id: string, title: string): Promise<void> {
  const transaction = database.transaction("books", "readwrite");
  const record = await transaction.store.get(id);
  if (record) await transaction.store.put({ ...record, title });
  await transaction.done;
}

export async function sweepRemoved(database: Database, now: number): Promise<void> {
  const transaction = database.transaction(["books", "parts", "drafts"], "readwrite");
  const records = await transaction.objectStore("books").getAll();
  for (const { id, removed } of records) {
    if (removed === undefined || removed > now - keptRemoved) continue;
    transaction.objectStore("books").delete(id);
    transaction.objectStore("parts").delete(partsOf(id));
    transaction.objectStore("drafts").delete(id);
  }
  await transaction.done;
}

/** The book that was saved or opened last. */
export async function lastBook(database: Database): Promise<string | undefined> {
  const id = await database.get("settings", "last book");
  const record = id === undefined ? undefined : await database.get("books", id);
  if (record && record.removed === undefined) return record.id;
  return (await listBooks(database))[0]?.id;
}

export async function setLastBook(database: Database, id: string): Promise<void> {
  await database.put("settings", id, "last book");
}

/** What is typed and not entered, so that closing the page does not lose it. */
export async function keepDraft(database: Database, id: string, draft: KeptDraft | undefined): Promise<void> {
  if (draft) await database.put("drafts", draft, id);
  else await database.delete("drafts", id);
}

export function keptDraft(database: Database, id: string): Promise<KeptDraft | undefined> {
  return database.get("drafts", id);
}
