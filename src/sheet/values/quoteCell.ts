import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import { textFromNumber } from "./textFromNumber.js";

const longestQuote = 40;

/** A cell as a message quotes it. */
export function quoteCell(cell: Cell): string {
  if (cell === null) {
    return "blank";
  }
  if (typeof cell === "number") {
    return textFromNumber(cell);
  }
  if (typeof cell === "boolean") {
    return cell ? "TRUE" : "FALSE";
  }
  if (cell instanceof CellError) {
    return cell.code;
  }
  return cell.length > longestQuote ? `"${cell.slice(0, longestQuote)}..."` : `"${cell}"`;
}
