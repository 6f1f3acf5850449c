import type { Cell } from "../../../../call/cell.js";
import { CellError } from "../../../../call/cell.js";
import { addressText } from "../../../../sheet/book/address.js";
import type { Book } from "../../../../sheet/book/book.js";
import { displayCell } from "../../../../sheet/display/displayCell.js";
import { changes } from "../../../../sheet/history/changes.js";

/** Programs that store 15 digits are off by up to 5e-15; a few steps of rounding in a formula are far below this. */
const tolerance = 1e-12;

/** A sentence on formulas that give another value here than the file they came in says; undefined where none does. */
export function changedValues(stored: Book, calculated: Book): string | undefined {
  let count = 0;
  let first = "";
  for (const { sheet, row, column, before, after } of changes(stored, calculated)) {
    if (isSame(before.value, after.value)) continue;
    if (count++ > 0) continue;
    const [old, now] = [before.value, after.value].map((cell) => shortened(displayCell(cell, { kind: "general" })));
    first = `${addressText(row, column, stored.sheets[sheet]?.name)}: ${old || "blank"} there, ${now || "blank"} here`;
  }
  if (count === 0) return undefined;
  const cells = count === 1 ? "1 cell has" : `${count.toLocaleString("en")} cells have`;
  return `Calculated anew, ${cells} another value than the file says, first ${first}.`;
}

/** A formula that refers to a blank cell is worth a blank here and 0 in other programs. */
function isNothing(cell: Cell): boolean {
  return cell === null || cell === "" || cell === 0;
}

function isSame(a: Cell, b: Cell): boolean {
  if (typeof a === "number" && typeof b === "number") {
    return a === b || Math.abs(a - b) <= tolerance * Math.max(Math.abs(a), Math.abs(b));
  }
  return a instanceof CellError && b instanceof CellError
    ? a.code === b.code
    : a === b || (isNothing(a) && isNothing(b));
}

function shortened(text: string): string {
  return text.length > 30 ? `${text.slice(0, 29)}…` : text;
}
