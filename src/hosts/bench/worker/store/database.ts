import { type DBSchema, type IDBPDatabase, openDB } from "idb";
import type { KeptLedger, KeptMark, KeptRevisions } from "../../../../files/bookFile/bookDocument.js";
import type { PackedCells } from "../../../../files/bookFile/packedCells.js";
import type { PackedRun } from "../../../../files/bookFile/packedColumn.js";
import type { Presentation } from "../../../../sheet/presentation/presentation.js";
import type { KeptDraft } from "../../protocol/answers.js";

/** A book without its cells. Columns, chunks and marks are parts of their own, so that a change writes few of them. */
export interface BookRecord {
  readonly id: string;
  readonly format: number;
  readonly title: string;
  readonly changed: number;
  readonly rows: number;
  /** When it was removed; it can be taken back until it is swept away. */
  readonly removed: number | undefined;
  /** Columns by the numbers of their parts; 0 for an empty one. */
  readonly sheets: readonly { readonly name: string; readonly columns: readonly number[] }[];
  readonly names: readonly { readonly name: string; readonly refersTo: string }[];
  readonly presentation: Presentation;
  readonly marks: readonly number[];
  readonly revisions?: Omit<KeptRevisions, "ledgers"> & { readonly ledgers: readonly number[] };
  readonly history: readonly string[];
  /** No part has this number or a higher one. */
  readonly next: number;
}

export interface ColumnPart {
  readonly pieces: readonly PiecePlace[];
  readonly runs: readonly PackedRun[];
}

/** Where a stored piece stands: a chunk from row `start`, of so many rows, of which it holds those that `spans` tells. */
export interface PiecePlace {
  readonly start: number;
  readonly length: number;
  readonly spans: string;
  readonly part: number;
}

export type Part =
  | { readonly is: "cells"; readonly cells: readonly PackedCells[] }
  | { readonly is: "column"; readonly column: ColumnPart }
  | { readonly is: "mark"; readonly mark: PackedMark }
  | { readonly is: "ledger"; readonly ledger: KeptLedger };

export interface PackedMark extends Omit<KeptMark, "table"> {
  readonly keys: readonly string[];
  readonly columns: readonly {
    readonly header: string;
    readonly rows: number;
    readonly cells: PackedCells | undefined;
    readonly sigma: PackedCells | undefined;
    readonly hasSigma: boolean;
  }[];
}

interface Schema extends DBSchema {
  books: { key: string; value: BookRecord };
  parts: { key: [book: string, number: number]; value: Part };
  drafts: { key: string; value: KeptDraft };
  settings: { key: "last book"; value: string };
}

export type Database = IDBPDatabase<Schema>;

export const bookRecordFormat = 1;

/** The browser's storage for this page. Rejects where the browser keeps none. */
export async function openDatabase(name = "barycell"): Promise<Database> {
  return openDB<Schema>(name, 1, {
    upgrade(database) {
      database.createObjectStore("books", { keyPath: "id" });
      database.createObjectStore("parts");
      database.createObjectStore("drafts");
      database.createObjectStore("settings");
    },
    // A page of a newer version that is opened beside this one must not wait for it.
    blocking: (_current, _blocked, event) => (event.target as IDBDatabase).close(),
  });
}

export function partsOf(book: string): IDBKeyRange {
  return IDBKeyRange.bound([book, 0], [book, Number.POSITIVE_INFINITY]);
}
