import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import { textFromNumber } from "./textFromNumber.js";

/** A cell as text (ISO/IEC 26300-3 section 6.3.14): blank is empty, a logical TRUE or FALSE, a number its shortest form. */
export function toText(cell: Cell): string | CellError {
  if (typeof cell === "string" || cell instanceof CellError) {
    return cell;
  }
  if (cell === null) {
    return "";
  }
  if (typeof cell === "boolean") {
    return cell ? "TRUE" : "FALSE";
  }
  return textFromNumber(cell);
}
