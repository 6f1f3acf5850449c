import { cellFunctionNames, findCellFunction } from "../../../call/cellFunctions.js";
import type { Functions } from "../../../sheet/formula/functions.js";

/** Our functions, as the sheet asks for them. */
export const functions: Functions = {
  cellFunction: findCellFunction,
  cellFunctionNames: () => cellFunctionNames,
};
