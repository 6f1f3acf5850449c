import type { TextEncoding } from "../text/textSource.js";

/** A place in a file: the data row and the line, both counted from 1. */
export interface Place {
  readonly row: number;
  readonly line: number;
}

/** Something about a delimited file that its owner should know; reading went on. Columns are counted from 0. */
export type Finding =
  | {
      readonly kind: "short-rows";
      readonly count: number;
      readonly first: Place;
      readonly fields: number;
      readonly expected: number;
    }
  | {
      readonly kind: "long-rows";
      readonly count: number;
      readonly first: Place;
      readonly fields: number;
      readonly expected: number;
      /** The columns of the table, those without a header included. */
      readonly columns: number;
    }
  | { readonly kind: "stray-quotes"; readonly count: number; readonly first: Place }
  | { readonly kind: "unclosed-quote"; readonly first: Place }
  | { readonly kind: "duplicate-header"; readonly header: string; readonly columns: readonly number[] }
  | { readonly kind: "empty-headers"; readonly columns: readonly number[] }
  | { readonly kind: "numbers-as-header"; readonly header: string }
  | { readonly kind: "one-column" }
  | { readonly kind: "no-rows" }
  | { readonly kind: "other-encoding"; readonly encoding: TextEncoding };
