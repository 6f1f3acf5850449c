import { type Cell, CellError } from "../../call/cell.js";

/** What a cell is written as, before quoting; cellOfField reads a number, truth value or blank back to the same cell. */
export function fieldOfCell(cell: Cell): string {
  if (typeof cell === "number") {
    return textOfNumber(cell);
  }
  if (typeof cell === "string") {
    return cell;
  }
  if (cell === null) {
    return "";
  }
  if (cell instanceof CellError) {
    return cell.code;
  }
  return cell ? "TRUE" : "FALSE";
}

/**
 * The shortest digits that read back to the same double. An integer beyond 2^53 takes an exponent: its digits alone
 * would read as an identifier.
 */
function textOfNumber(value: number): string {
  if (Object.is(value, -0)) {
    return "-0";
  }
  if (!Number.isFinite(value)) {
    return "#NUM!";
  }
  return Number.isInteger(value) && !Number.isSafeInteger(value) ? value.toExponential() : String(value);
}
