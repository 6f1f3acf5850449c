import type { Place } from "../../../sheet/book/book.js";
import type { ExportedFile } from "./answers.js";
import type { Outcome } from "./request.js";

/** What is kept with the book for its revisions, as typed: a line for each. */
export interface RevisionTexts {
  /** `old = new` */
  readonly aliases: string;
  /** `K >= 1 m/s` */
  readonly conditions: string;
}

/** What is asked of a revision, as it was typed. */
export interface ReviseWords extends RevisionTexts {
  /** Header of the column that names the rows; empty for the one that fits best. */
  readonly key: string;
  /** The table or sheet of the file; empty for the first. */
  readonly table: string;
  /** Blanks of the file erase what stands in the table. */
  readonly erases: boolean;
}

export interface ReviseProblem {
  readonly word: "file" | keyof ReviseWords;
  readonly message: string;
}

export type ReviseAnswer =
  | { readonly is: "preview"; readonly preview: RevisionPreview }
  | { readonly is: "problems"; readonly problems: readonly ReviseProblem[]; readonly choices: RevisionChoices }
  | { readonly is: "cancelled" };

/** What can be chosen among, as far as the file could be read. */
export interface RevisionChoices {
  /** Headers of the table's columns that the file has too, the one that fits best first. */
  readonly keys: readonly string[];
  /** Tables of the file. */
  readonly tables: readonly string[];
}

/** What a revision would do; nothing is done yet. */
export interface RevisionPreview extends RevisionChoices {
  readonly file: string;
  readonly sheet: number;
  readonly sheetName: string;
  readonly key: string;
  readonly table: string;
  /** How rows were matched, in one sentence. */
  readonly matched: string;
  readonly rows: {
    readonly matched: number;
    readonly onlyInTable: number;
    readonly onlyInFile: number;
    readonly ambiguous: number;
  };
  readonly columns: readonly PreviewColumn[];
  readonly findings: readonly string[];
  /** Values and uncertainties that would change. */
  readonly cells: number;
}

export interface PreviewColumn {
  readonly header: string;
  /** The header in the file, where it is another. */
  readonly from: string | undefined;
  /** The file's unit, where values are converted from it. */
  readonly convertedFrom: string | undefined;
  readonly values: number;
  readonly uncertainties: number;
  readonly bySigma: PreviewChange | undefined;
  readonly byPart: PreviewChange | undefined;
}

export interface PreviewChange {
  readonly place: Place;
  readonly key: string;
  readonly before: number;
  readonly after: number;
  /** In units of the value's own uncertainty. */
  readonly sigmas: number | undefined;
  readonly relative: number | undefined;
}

export type Revised = { readonly is: "revised"; readonly ledger: LedgerSummary } | Exclude<Outcome, { is: "done" }>;

export interface LedgerSummary {
  readonly id: string;
  readonly file: string;
  /** ISO 8601, UTC. */
  readonly date: string;
  readonly sha256: string;
  readonly sheet: string;
  /** Cells that changed, and how many of them have entries. */
  readonly changes: number;
  readonly entries: number;
  readonly inputs: readonly { readonly input: string; readonly cells: number }[];
  /** Why changes have no parts. */
  readonly unshared: string | undefined;
  /** The table before and after is still held, since the revision was applied on this visit. */
  readonly isWhole: boolean;
}

export interface LedgerView extends LedgerSummary {
  /** Of what formulas work out, the most important first. */
  readonly moved: readonly LedgerLine[];
  /** Of the entries, those that formulas work out. */
  readonly derived: number;
  readonly conditions: readonly LedgerCondition[];
  /** Headers of the first input and of the column that moved most, for a plot. */
  readonly axes: { readonly x: string; readonly y: string };
}

export interface LedgerLine {
  /** Undefined where the cell is no longer there. */
  readonly place: Place | undefined;
  readonly key: string;
  readonly header: string;
  readonly before: string;
  readonly after: string;
  readonly change: string;
  readonly sigmas: number | undefined;
  readonly relative: number | undefined;
  readonly movedBy: string | undefined;
  /** What each input did to it, the most first. */
  readonly parts: readonly string[];
}

export interface LedgerCondition {
  readonly condition: string;
  /** Rows that met it. */
  readonly before: number;
  readonly after: number;
  readonly gained: readonly LedgerCrossing[];
  readonly lost: readonly LedgerCrossing[];
}

export interface LedgerCrossing {
  readonly place: Place | undefined;
  readonly key: string;
  readonly before: string;
  readonly after: string;
}

export type LedgerForm = "sheet" | "markdown" | "json";

export type WrittenLedger = { readonly is: "file"; readonly file: ExportedFile } | Outcome;

/** Two columns before and after a revision, for the rows that moved in either. */
export type RevisionMoves =
  | {
      readonly is: "moves";
      readonly file: string;
      readonly date: string;
      /** Index of the sheet, and its rows now. */
      readonly sheet: number;
      readonly rows: Int32Array;
      readonly x: MovedColumn;
      readonly y: MovedColumn;
    }
  | { readonly is: "missing"; readonly message: string };

export interface MovedColumn {
  readonly name: string;
  readonly unit: string;
  readonly before: Float64Array;
  readonly after: Float64Array;
}
