import type { NumberFormat } from "../display/numberFormat.js";

/** How one column is seen; what is left out is as it comes. */
export interface ColumnPresentation {
  /** [pixel] */
  readonly width?: number;
  readonly hidden?: true;
  readonly format?: NumberFormat;
}

export interface SheetPresentation {
  readonly frozenColumns: number;
  /** By column; past the end, and where it is undefined, a column is as it comes. */
  readonly columns: readonly (ColumnPresentation | undefined)[];
}

/** How the sheets of a book are seen, sheet by sheet; a part of its versions, so that it is undone with them. */
export type Presentation = readonly SheetPresentation[];

export const plainSheet: SheetPresentation = { frozenColumns: 0, columns: [] };

export function sheetPresentation(presentation: Presentation, sheet: number): SheetPresentation {
  return presentation[sheet] ?? plainSheet;
}
