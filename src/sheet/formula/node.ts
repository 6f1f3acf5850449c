import type { CellFunction } from "../../call/cellFunction.js";
import type { Operand } from "../values/operand.js";
import type { Operator } from "../values/operate.js";
import type { WorksheetFunction } from "../worksheetFunctions/worksheetFunction.js";

/**
 * The tree of a formula. References are indices into the formula's list, so that a tree outlives the rewriting of its
 * references. `fixed`: worth the same in every row of a column.
 */
export type Node = { readonly fixed: boolean } & (
  | { readonly kind: "value"; readonly value: Operand }
  | { readonly kind: "reference"; readonly index: number }
  /** `A2#`: all cells that the formula in A2 filled. */
  | { readonly kind: "spill"; readonly index: number }
  /** A defined name. */
  | { readonly kind: "name"; readonly name: string }
  | { readonly kind: "unary"; readonly operator: "+" | "-" | "%" | "@"; readonly operand: Node }
  | { readonly kind: "binary"; readonly operator: Operator; readonly left: Node; readonly right: Node }
  /** Cells in both references. */
  | { readonly kind: "intersection"; readonly left: Node; readonly right: Node }
  | {
      readonly kind: "choice";
      readonly name: Choice;
      readonly parameters: Parameters;
      readonly otherwise: WorksheetFunction;
    }
  | { readonly kind: "own"; readonly called: CellFunction; readonly parameters: Parameters }
  | { readonly kind: "worksheet"; readonly called: WorksheetFunction; readonly parameters: Parameters }
  /** ROW, COLUMN, of the formula's own cell or of a reference. */
  | { readonly kind: "position"; readonly axis: "row" | "column"; readonly of: Node | undefined }
  /** What LET names: one node in several places, evaluated once. */
  | { readonly kind: "shared"; readonly value: Node }
);

export type Parameters = readonly (Node | undefined)[];

/** Functions that look at one argument before they need another. */
export type Choice = "IF" | "IFERROR" | "IFNA";
