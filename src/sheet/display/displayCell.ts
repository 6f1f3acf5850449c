import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import { displayNumber } from "./displayNumber.js";
import type { NumberFormat } from "./numberFormat.js";

/** A cell as text: numbers in the format, errors as their code, a blank as nothing. */
export function displayCell(cell: Cell, format: NumberFormat): string {
  if (typeof cell === "number") {
    return displayNumber(cell, format);
  }
  if (typeof cell === "boolean") {
    return cell ? "TRUE" : "FALSE";
  }
  return cell instanceof CellError ? cell.code : (cell ?? "");
}
