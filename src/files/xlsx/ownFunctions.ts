import { cellFunctionNames, findCellFunction } from "../../call/cellFunctions.js";
import type { Functions } from "../../sheet/formula/functions.js";

/** The functions that formulas of workbooks may name besides those of every worksheet. */
export const ownFunctions: Functions = {
  cellFunction: findCellFunction,
  cellFunctionNames: () => cellFunctionNames,
};
