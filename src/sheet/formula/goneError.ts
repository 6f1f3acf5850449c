import { CellError } from "../../call/cell.js";

export const goneError = new CellError(
  "#REF!",
  "a reference to cells that are gone",
  "the formula refers to cells that were deleted or lie outside the sheet; type the reference again, for example B2",
);
