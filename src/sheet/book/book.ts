import type { Formula } from "../formula/formula.js";
import type { Cells } from "./cells.js";
import { noCells } from "./cells.js";
import type { Span } from "./spans.js";

/** One formula, row-relative, over the rows it was filled down. */
export interface Run extends Span {
  readonly formula: Formula;
}

/**
 * Rows whose formula gave more than one cell, all of one size. Where `blocked`, the rectangle is not free and the
 * cells hold an error instead.
 */
export interface Spill extends Span {
  readonly rows: number;
  readonly width: number;
  readonly blocked: boolean;
}

/** Cells that a formula in `column` filled: the formula of the same row, or of one row where `row` is given. */
export interface Claim extends Span {
  readonly column: number;
  readonly row: number | undefined;
}

/**
 * A column of a sheet. Rows in no run and no claim hold what was typed; the cells of runs and claims hold what was
 * calculated, so a version of a book is whole.
 */
export interface SheetColumn {
  readonly cells: Cells;
  readonly runs: readonly Run[];
  readonly spills: readonly Spill[];
  readonly claims: readonly Claim[];
}

export interface Sheet {
  readonly name: string;
  readonly columns: readonly SheetColumn[];
}

/** A name for cells or for a constant, as a formula without relative references. */
export interface DefinedName {
  readonly name: string;
  readonly formula: Formula;
}

/** Sheets at one moment. Every edit makes another book that shares what did not change. */
export interface Book {
  readonly sheets: readonly Sheet[];
  readonly names: readonly DefinedName[];
}

/** A cell; sheets, rows and columns count from zero. */
export interface Place {
  readonly sheet: number;
  readonly row: number;
  readonly column: number;
}

/** Cells below each other. */
export interface ColumnSpan extends Span {
  readonly sheet: number;
  readonly column: number;
}

/** A rectangle of cells, both corners inside. */
export interface Area {
  readonly sheet: number;
  readonly top: number;
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
}

export const emptyColumn: SheetColumn = { cells: noCells, runs: [], spills: [], claims: [] };

export function columnAt(book: Book, sheet: number, column: number): SheetColumn {
  return book.sheets[sheet]?.columns[column] ?? emptyColumn;
}
