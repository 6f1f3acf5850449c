import type { CellFunction } from "../../call/cellFunction.js";

/** The cell functions that a host adds to those of every worksheet. */
export interface Functions {
  /** The function of a name in capital letters: "BARY.REFLEX". */
  cellFunction(name: string): CellFunction | undefined;
  cellFunctionNames(): readonly string[];
}

export const noFunctions: Functions = { cellFunction: () => undefined, cellFunctionNames: () => [] };
