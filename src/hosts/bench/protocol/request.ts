import type { Area, Place } from "../../../sheet/book/book.js";
import type { NumberFormat } from "../../../sheet/display/numberFormat.js";
import type { SortKey } from "../../../sheet/edit/orderRows.js";

/** Something the analyst does to a sheet, as data that can cross to the worker. Each becomes one undo step. */
export type Action =
  /** What was typed, row by row: numbers, texts, `=formulas`; an apostrophe in front keeps a text a text. */
  | { readonly do: "type"; readonly place: Place; readonly texts: readonly (readonly string[])[] }
  /** One text typed over a whole area; a formula is written for `place` and relative in the other cells. */
  | { readonly do: "type over"; readonly area: Area; readonly place: Place; readonly text: string }
  | { readonly do: "clear"; readonly area: Area }
  /** Repeats the cells of an area beyond one of its sides. */
  | {
      readonly do: "fill";
      readonly area: Area;
      readonly toward: "down" | "up" | "right" | "left";
      readonly count: number;
      readonly series: boolean;
    }
  /** Fills the first row of an area over its other rows. */
  | { readonly do: "fill over"; readonly area: Area }
  /** Fills an area down to the last row of the table beside it. */
  | { readonly do: "fill to end"; readonly area: Area }
  /** `over` is the selection: what was copied is repeated where it fits into it exactly, a single cell fills it. */
  | {
      readonly do: "paste";
      readonly place: Place;
      readonly clipboard: Clipboard;
      readonly what: "formulas" | "values";
      readonly over?: Area;
    }
  | { readonly do: "move"; readonly area: Area; readonly place: Place }
  | { readonly do: "insert rows"; readonly sheet: number; readonly at: number; readonly count: number }
  | { readonly do: "delete rows"; readonly sheet: number; readonly at: number; readonly count: number }
  | { readonly do: "insert columns"; readonly sheet: number; readonly at: number; readonly count: number }
  | { readonly do: "delete columns"; readonly sheet: number; readonly at: number; readonly count: number }
  /** Puts columns before another one; formulas follow. */
  | {
      readonly do: "reorder columns";
      readonly sheet: number;
      readonly from: number;
      readonly count: number;
      readonly before: number;
    }
  | { readonly do: "sort"; readonly area: Area; readonly keys: readonly SortKey[] }
  | { readonly do: "replace"; readonly area: Area; readonly search: string; readonly replacement: string }
  | { readonly do: "text to number"; readonly sheet: number; readonly column: number }
  /** Another unit in a header; `convert` keeps what the numbers mean, otherwise the numbers are kept as they stand. */
  | { readonly do: "set unit"; readonly place: Place; readonly unit: string; readonly convert: boolean }
  | {
      readonly do: "format";
      readonly sheet: number;
      readonly columns: readonly number[];
      readonly format: NumberFormat;
    }
  | { readonly do: "width"; readonly sheet: number; readonly columns: readonly number[]; readonly width: number }
  | {
      readonly do: "hide columns";
      readonly sheet: number;
      readonly columns: readonly number[];
      readonly hidden: boolean;
    }
  | { readonly do: "freeze"; readonly sheet: number; readonly columns: number }
  | { readonly do: "add sheet"; readonly name: string }
  | { readonly do: "remove sheet"; readonly sheet: number }
  | { readonly do: "rename sheet"; readonly sheet: number; readonly name: string }
  | { readonly do: "define name"; readonly name: string; readonly text: string; readonly sheet: number }
  | { readonly do: "remove name"; readonly name: string };

/** What the clipboard holds; `own` is the token of a copy made on this page, which carries formulas. */
export interface Clipboard {
  readonly text: string;
  readonly html: string;
  readonly own?: string;
}

/** What came of an action; the state of the book is sent by itself. */
export type Outcome =
  /** `select` is what the action leaves selected; `said` is told once. */
  | { readonly is: "done"; readonly select?: Area; readonly said?: string }
  | { readonly is: "refused"; readonly message: string }
  | { readonly is: "cancelled" };

export interface FilterCondition {
  readonly column: number;
  /** `holds error` and `blank` take no text. Numbers are compared in the column's own unit; `1 m/s` converts. */
  readonly test: "=" | "<>" | "<" | "<=" | ">" | ">=" | "contains" | "holds error" | "blank" | "not blank";
  readonly text: string;
}

export interface FindOptions {
  readonly text: string;
  readonly matchCase: boolean;
  readonly wholeCell: boolean;
  readonly inFormulas: boolean;
}
