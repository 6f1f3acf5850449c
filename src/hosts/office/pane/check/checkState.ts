import type { ColumnCheck } from "../../../../table/checkColumn.js";
import type { Area } from "../worksheet.js";

/** A column with what was understood and what to look at. */
export interface CheckedColumn {
  readonly check: ColumnCheck;
  readonly address: string;
  readonly findings: readonly CheckedFinding[];
}

export interface CheckedFinding {
  readonly sentence: string;
  /** The cell to look at. */
  readonly cell: Area;
}

export type CheckState =
  | { readonly is: "reading" }
  | { readonly is: "no table" }
  | {
      readonly is: "checked";
      readonly area: string;
      readonly rows: number;
      readonly columns: readonly CheckedColumn[];
    };

export interface CheckActions {
  again(): void;
  goTo(cell: Area): void;
}
