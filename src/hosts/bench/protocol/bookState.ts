import type { NumberFormat } from "../../../sheet/display/numberFormat.js";
import type { FilterCondition } from "./request.js";

/** What the page knows of the open book without asking; sent whole after every change. */
export interface BookState {
  readonly id: string;
  readonly title: string;
  /** Grows with every change; windows and answers carry the one they belong to. */
  readonly version: number;
  readonly sheets: readonly SheetState[];
  readonly names: readonly { readonly name: string; readonly refersTo: string }[];
  readonly history: { readonly labels: readonly string[]; readonly present: number };
  readonly saved: SavedState;
  /** Cells that hold errors, over all sheets. */
  readonly problems: number;
}

export type SavedState =
  | { readonly is: "saved"; readonly at: number }
  | { readonly is: "saving" }
  /** Storage is full or denied, or another tab has the book: the sentence says what to do. */
  | { readonly is: "not saved"; readonly message: string };

export interface SheetState {
  readonly name: string;
  /** Rows and columns in use. */
  readonly rows: number;
  readonly columns: number;
  /** Rows seen: fewer than `rows` while a filter is on. */
  readonly visibleRows: number;
  readonly filter: readonly FilterCondition[];
  readonly frozenColumns: number;
  readonly columnStates: readonly ColumnState[];
}

export interface ColumnState {
  /** The header's words without its unit, as the grid sets them. */
  readonly name: string;
  /** The unit as the header spells it; empty where it states none. */
  readonly unit: string;
  /** What was understood of the header, or why not. */
  readonly reading:
    | { readonly is: "unit"; readonly unit: string; readonly kind: string; readonly quantity: string | undefined }
    | { readonly is: "none"; readonly quantity: string | undefined }
    | { readonly is: "problem"; readonly message: string };
  /** The column left of this whose uncertainty it is. */
  readonly sigmaOf: number | undefined;
  /** The last column of sigmas that belong to this value column. */
  readonly sigmasTo: number | undefined;
  readonly width: number | undefined;
  readonly hidden: boolean;
  readonly format: NumberFormat;
  /** A column whose cells are filled by formulas. */
  readonly derived: boolean;
}
