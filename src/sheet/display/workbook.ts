import type { Book } from "../book/book.js";
import type { Span } from "../book/spans.js";
import type { NumberFormat } from "./numberFormat.js";

/** Rows of a column whose numbers are shown in one format. */
export interface FormatSpan extends Span {
  readonly format: NumberFormat;
  /** The format code of the file the cells came from, where it says more than `format`: it is kept for writing. */
  readonly code: string | undefined;
}

/** How a column is shown. */
export interface WorkbookColumn {
  /** In characters of the worksheet's font; undefined is the usual width. */
  readonly width: number | undefined;
  readonly hidden: boolean;
  /** Sorted and not overlapping; rows in none are shown in general form. */
  readonly formats: readonly FormatSpan[];
}

/** How a sheet is shown. */
export interface WorkbookSheet {
  readonly hidden: boolean;
  /** Rows and columns that stay in sight. */
  readonly frozenRows: number;
  readonly frozenColumns: number;
  /** By column; columns past the end are shown as usual. */
  readonly columns: readonly WorkbookColumn[];
}

/** A book, and how each of its sheets is shown. */
export interface Workbook {
  readonly book: Book;
  readonly sheets: readonly WorkbookSheet[];
  /** What the file held besides and is not kept, one sentence each; empty where nothing is lost. */
  readonly notes: readonly string[];
}

export const plainWorkbookColumn: WorkbookColumn = { width: undefined, hidden: false, formats: [] };

export const plainWorkbookSheet: WorkbookSheet = { hidden: false, frozenRows: 0, frozenColumns: 0, columns: [] };
