import type { Place } from "../../../sheet/book/book.js";

/** Something wrong, or worth knowing, in a formula that is being typed; offsets count in its text. */
export interface Diagnostic {
  readonly from: number;
  readonly to: number;
  readonly severity: "error" | "hint";
  readonly message: string;
}

/** What a formula would give in its place, before it is entered. */
export interface FormulaCheck {
  readonly diagnostics: readonly Diagnostic[];
  /** The value as it would be shown, with its unit; undefined where it has none or is an error. */
  readonly preview: string | undefined;
}

/** A function as completion and hints tell it. */
export interface FunctionEntry {
  /** As typed: `BARY.REFLEX`, `SUM`. */
  readonly name: string;
  readonly question: string;
  readonly own: boolean;
  readonly parameters: readonly {
    readonly name: string;
    readonly optional: boolean;
    readonly repeating: boolean;
    /** Kind, range and fallback in words; empty for functions that are not ours. */
    readonly meaning: string;
    /** The unit most used for it; empty where it has none. */
    readonly unit: string;
  }[];
  readonly result: string;
}

/** Text for one cell, as completed by a key press, and where the caret belongs. */
export interface CompletedText {
  readonly text: string;
  readonly caret: number;
  /** What was completed, or why nothing could be. */
  readonly said: string;
}

/** The story of one cell for the side panel: everything as text, so that the panel only sets it. */
export interface WhyCell {
  readonly place: Place;
  readonly address: string;
  readonly value: string;
  /** The full double, or the whole text. */
  readonly exact: string;
  readonly unit: string;
  readonly error: string | undefined;
  /** As typed; undefined for a literal. */
  readonly formula: string | undefined;
  /** Where the formula that filled this cell stands, if elsewhere. */
  readonly filledFrom: { readonly address: string; readonly place: Place } | undefined;
  readonly call: WhyCall | undefined;
  /** Cells that the formula reads, one step back. */
  readonly reads: readonly { readonly address: string; readonly place: Place; readonly text: string }[];
  /** The version at which the value last changed, by its name in the history. */
  readonly changedBy: string | undefined;
}

export interface WhyCall {
  readonly name: string;
  readonly question: string;
  /** The call is only a part of the formula. */
  readonly part: boolean;
  readonly result: string;
  readonly unit: string;
  readonly inputs: readonly WhyInput[];
  /** The published formula in plain notation, and the same as MathML. */
  readonly formula: string;
  readonly formulaMath: string | undefined;
  readonly source: string;
  readonly note: string | undefined;
  /** Standard uncertainty of the result at first order, upper and lower. */
  readonly sigma: readonly [number, number] | undefined;
  readonly canDraw: boolean;
}

export interface WhyInput {
  readonly name: string;
  /** As it stands in the worksheet. */
  readonly cell: string;
  readonly address: string | undefined;
  readonly place: Place | undefined;
  /** As it was read, with its unit and uncertainty. */
  readonly read: string | undefined;
  readonly base: string | undefined;
  readonly header: string | undefined;
  readonly assumed: string | undefined;
  /** Its part in the variance of the result, 0 to 1. */
  readonly share: number | undefined;
  readonly problem: boolean;
}

/** Draws of a result over the uncertainties of its inputs, beside the first-order answer. */
export interface Distribution {
  readonly place: Place;
  readonly unit: string;
  readonly draws: number;
  /** Draws whose inputs fell outside what the function accepts. */
  readonly rejected: number;
  readonly seed: number;
  readonly mean: number;
  readonly deviation: number;
  /** 2.3, 15.9, 50, 84.1 and 97.7 per cent. */
  readonly percentiles: readonly [number, number, number, number, number];
  readonly histogram: { readonly from: number; readonly to: number; readonly counts: readonly number[] };
  /** The value of the cell and its first-order uncertainty. */
  readonly value: number;
  readonly upper: number;
  readonly lower: number;
}

/** What was understood of one column, as sentences. */
export interface ColumnReport {
  readonly column: number;
  readonly header: string;
  readonly understood: string;
  readonly contents: string;
  readonly findings: readonly { readonly message: string; readonly place: Place | undefined }[];
}

export interface TableReport {
  readonly sheet: number;
  readonly columns: readonly ColumnReport[];
  /** Problems of formula cells, grouped. */
  readonly errors: readonly { readonly message: string; readonly count: number; readonly first: Place }[];
}

/** A state of the table that later ones are compared with. */
export interface MarkState {
  readonly id: string;
  readonly name: string;
  readonly at: number;
  readonly sheet: string;
}

export interface ComparisonReport {
  readonly mark: MarkState;
  readonly movements: readonly {
    readonly place: Place | undefined;
    readonly key: string;
    readonly header: string;
    readonly before: string;
    readonly after: string;
    readonly change: string;
    /** In units of the value's own uncertainty; undefined where it has none. */
    readonly sigmas: number | undefined;
    readonly relative: number | undefined;
  }[];
  readonly movedCells: number;
  readonly sentence: string;
}

/** A column as numbers for a plot; NaN where a cell holds none. */
export interface PlotColumn {
  readonly header: string;
  readonly name: string;
  readonly unit: string;
  readonly rows: Int32Array;
  readonly values: Float64Array;
  readonly upper: Float64Array | undefined;
  readonly lower: Float64Array | undefined;
  /** Texts, where the column holds words rather than numbers. */
  readonly words: readonly string[] | undefined;
}

export interface BookEntry {
  readonly id: string;
  readonly title: string;
  readonly changed: number;
  readonly rows: number;
}

export interface ExportedFile {
  readonly name: string;
  readonly type: string;
  readonly bytes: Uint8Array;
  /** What of the book the file does not hold, one sentence each. */
  readonly told: readonly string[];
}

/** What came of opening a file. */
export type Opened =
  | { readonly is: "opened"; readonly said: string; readonly findings: readonly string[] }
  | { readonly is: "refused"; readonly message: string }
  | { readonly is: "cancelled" };

/** What another tab, or a crash, left typed and not entered. */
export interface KeptDraft {
  readonly place: Place;
  readonly text: string;
}

export interface Summary {
  /** Cells that hold anything. */
  readonly filled: number;
  readonly numbers: number;
  readonly errors: number;
  readonly sum: number;
  readonly mean: number;
  readonly least: number;
  readonly most: number;
  /** The unit of the columns, where they all have the same. */
  readonly unit: string;
}

/** What the star of one row does, worked out from the row's own columns. */
export type CurveAnswer =
  | {
      readonly is: "curve";
      readonly title: string;
      /** Of K and of the velocities. */
      readonly unit: string;
      readonly amplitude: number;
      /** The orbital phase from the reference time, 0 to 1. */
      readonly phases: Float64Array;
      readonly velocities: Float64Array;
      /** In days; undefined where the period is not in the table. */
      readonly period: number | undefined;
      /** The reference time as an instant [d], and its frame, where the table has one. */
      readonly reference: { readonly day: number; readonly frame: string } | undefined;
      /** What stood in for columns that the table lacks. */
      readonly assumed: readonly string[];
    }
  | { readonly is: "missing"; readonly message: string };
