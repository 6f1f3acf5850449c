import type { CellStore } from "../../cellStore.js";

/** Rows as they are seen, the header first: a filter leaves some out, and spare rows follow the used ones. */
export interface RowAxis {
  readonly count: number;
  /** The row of the sheet. */
  toSheet(viewRow: number): number;
  /** The row in view; the next one where a filter hides it. */
  toView(sheetRow: number): number;
  /** The last row in view that is not below a row of the sheet. */
  lastInView(sheetRow: number): number;
}

export function rowAxis(
  cells: Pick<CellStore, "sheetRow" | "viewRow">,
  used: { readonly rows: number; readonly visibleRows: number },
  count: number,
): RowAxis {
  const hidden = used.rows - used.visibleRows;
  const toSheet = (viewRow: number) => (viewRow < used.visibleRows ? cells.sheetRow(viewRow) : viewRow + hidden);
  const toView = (sheetRow: number) => (sheetRow < used.rows ? cells.viewRow(sheetRow) : sheetRow - hidden);
  return { count, toSheet, toView, lastInView: (sheetRow) => toView(sheetRow + 1) - 1 };
}
