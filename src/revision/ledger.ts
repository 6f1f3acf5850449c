import type { Cell } from "../call/cell.js";
import type { Change } from "../table/changeOf.js";
import type { RowPair } from "../table/matchRows.js";
import type { ColumnPair } from "../table/pairColumns.js";
import type { BookColumn, BookTable } from "./bookTable.js";
import type { ChangedInput } from "./changedInputs.js";
import type { Condition } from "./condition.js";

/** Where revised values came from. */
export interface RevisionSource {
  /** When it was taken over: ISO 8601, UTC. */
  readonly date: string;
  readonly file: string;
  /** SHA-256 of the file's bytes, 64 hexadecimal digits. */
  readonly sha256: string;
}

/**
 * What moved between two states of a table. It holds both states, which share what did not change, and works the single
 * entries out when they are asked for.
 */
export interface Ledger {
  readonly source: RevisionSource;
  readonly sheet: string;
  readonly before: BookTable;
  readonly after: BookTable;
  /** Which rows belong together; undefined where they are the same ones in the same order. */
  readonly rows: readonly RowPair[] | undefined;
  readonly nameOfRow: (at: number) => string;
  readonly columns: readonly LedgerColumn[];
  readonly inputs: readonly ChangedInput[];
  /** Why no change can be shared out among the inputs; undefined where it can. */
  readonly unshared: string | undefined;
  readonly conditions: readonly WatchedCondition[];
  /** Headers of columns of one state only. */
  readonly onlyBefore: readonly string[];
  readonly onlyAfter: readonly string[];
}

export interface LedgerColumn {
  readonly header: string;
  readonly role: "revised" | "derived";
  readonly pair: ColumnPair<BookColumn>;
  readonly changed: number;
  /** Of the changed cells, those that were numbers and are none now, and the other way round. */
  readonly ceased: number;
  readonly began: number;
  readonly largest: LedgerChange | undefined;
  /** For each input the headers on the way to this column; undefined where there is none. */
  readonly ways: readonly (readonly string[] | undefined)[];
}

/** A cell that changed: `at` counts the rows of the ledger. */
export interface LedgerChange extends Change {
  readonly at: number;
  readonly before: Cell;
  /** In the unit that the column had before. */
  readonly after: Cell;
}

/** A condition and the rows that crossed it. */
export interface WatchedCondition {
  readonly condition: Condition;
  readonly metBefore: number;
  readonly metAfter: number;
  readonly gained: readonly Crossing[];
  readonly lost: readonly Crossing[];
}

export interface Crossing {
  readonly key: string;
  readonly before: Cell;
  readonly after: Cell;
}
