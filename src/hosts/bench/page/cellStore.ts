import type { ShownCell } from "../protocol/shown.js";

/** The cells near what is in view, fetched from the worker in blocks as they are asked for. */
export interface CellStore {
  /**
   * A cell by its row in view; undefined while it is on its way (the last known cell is given meanwhile where there is
   * one). The worker is asked, and `onArrival` listeners are called when it came.
   */
  cellAt(viewRow: number, column: number): ShownCell | undefined;
  /** The sheet's row of a row in view; the same number while no filter is on. */
  sheetRow(viewRow: number): number;
  /** The row in view of a sheet's row, or the one after it where a filter hides it. */
  viewRow(sheetRow: number): number;
  /** Rows in view, the header row counted. */
  viewRows(): number;
  onArrival(listener: () => void): () => void;
}
