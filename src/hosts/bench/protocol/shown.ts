/** One cell as the grid draws it. */
export interface ShownCell {
  readonly text: string;
  readonly is: "number" | "text" | "logical" | "error" | "blank";
  /** The sentence of an error. */
  readonly message?: string;
  readonly hasFormula?: true;
  /** It changed with the last action: `edited` by hand, `followed` through formulas. */
  readonly flash?: "edited" | "followed";
  /** Filled by the formula of a cell to its left or above. */
  readonly spilled?: true;
}

/** A rectangle of a sheet as it stood at one version; rows in view order, with their row of the sheet. */
export interface ShownWindow {
  readonly version: number;
  readonly sheet: number;
  readonly from: number;
  readonly to: number;
  readonly left: number;
  readonly right: number;
  /** The sheet's row of each row in view; they differ while a filter is on. */
  readonly rows: Int32Array;
  /** Row by row, `left` to `right`, the last not included. */
  readonly cells: readonly (readonly ShownCell[])[];
}
