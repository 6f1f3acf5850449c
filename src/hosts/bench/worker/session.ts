import type { KeptLedger } from "../../../files/bookFile/bookDocument.js";
import type { LedgerRecord } from "../../../revision/ledgerRecord.js";
import type { Area, Book } from "../../../sheet/book/book.js";
import type { History, Version } from "../../../sheet/history/history.js";
import { presentVersion } from "../../../sheet/history/history.js";
import type { Presentation } from "../../../sheet/presentation/presentation.js";
import type { ComparedTable } from "../../../table/compareTables.js";
import type { FilterCondition } from "../protocol/request.js";

/** A book as it was after an action, and how it was seen. */
export interface BookVersion extends Version {
  readonly presentation: Presentation;
  /** Cells stand elsewhere than in the version before: the two cannot be compared place by place. */
  readonly moved?: true;
  /** What a revision moved, where this version came of one. */
  readonly ledger?: BookLedger;
}

/** The derived values of one sheet as they stood at one moment; kept with the book. */
export interface SessionMark {
  readonly id: string;
  readonly name: string;
  /** Milliseconds since 1970. */
  readonly at: number;
  /** Name of the sheet. */
  readonly sheet: string;
  readonly table: ComparedTable;
}

/** The ledger of a revision, bounded, as it is kept with the book. */
export interface BookLedger extends LedgerRecord {
  /** How many cells of the sheet changed in all, of which the most important have entries. */
  readonly changes: number;
  /** Header of the column that named the rows. */
  readonly key: string;
}

/** What revisions are asked with, and the ledgers that came with the book when it was opened. */
export interface SessionRevisions {
  readonly aliases: string;
  readonly conditions: string;
  readonly ledgers: readonly KeptLedger[];
}

/** The conditions set on a sheet and the rows they leave. */
export interface SheetFilter {
  readonly sheet: string;
  readonly conditions: readonly FilterCondition[];
  /** Rows chosen by hand, to which the conditions are applied. */
  readonly among: Int32Array | undefined;
  /** The rows that are seen, the header row among them, of those before `end`; what is below is seen. */
  readonly rows: Int32Array;
  readonly end: number;
  /** The book of which these are the rows. */
  readonly of: Book;
}

/** What the last action changed: the book before it, and the cells that it wrote itself. */
export interface LastFlash {
  readonly before: Book;
  readonly edited: readonly Area[];
}

/** One open book at one moment. Every action makes another session; the one before stays whole. */
export interface Session {
  readonly id: string;
  readonly title: string;
  /** Grows with every change. */
  readonly version: number;
  readonly history: History<BookVersion>;
  /** By sheet; undefined where none is set. */
  readonly filters: readonly (SheetFilter | undefined)[];
  /** The latest first. */
  readonly marks: readonly SessionMark[];
  readonly revisions: SessionRevisions;
  readonly flash: LastFlash | undefined;
}

/** What a session is made of when a book is opened. */
export interface OpenedBook {
  readonly id: string;
  readonly title: string;
  readonly book: Book;
  readonly presentation?: Presentation;
  readonly marks?: readonly SessionMark[];
  readonly revisions?: SessionRevisions | undefined;
  /** What the first version is called in the history. */
  readonly name?: string;
  /** The version number to begin with, so that numbers go on growing over all books of a page. */
  readonly version?: number;
}

const noRevisions: SessionRevisions = { aliases: "", conditions: "", ledgers: [] };

export function openSession({ id, title, book, ...more }: OpenedBook): Session {
  const { presentation = [], marks = [], revisions = noRevisions, name = "opened", version = 1 } = more;
  const history: History<BookVersion> = { versions: [{ name, book, presentation }], present: 0 };
  return { id, title, version, history, filters: [], marks, revisions, flash: undefined };
}

export function bookOfSession({ history }: Session): Book {
  return presentVersion(history).book;
}

export function presentationOfSession({ history }: Session): Presentation {
  return presentVersion(history).presentation;
}

export function renamed(session: Session, title: string): Session {
  return { ...session, title, version: session.version + 1 };
}
