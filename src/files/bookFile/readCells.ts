import { type Cell, CellError, type ErrorCode } from "../../call/cell.js";
import { type Column, columnOf } from "../../call/column.js";
import { anObject, member, oneOf, type Part, text, unlike } from "./expectation.js";

const codes: readonly ErrorCode[] = ["#VALUE!", "#N/A", "#DIV/0!", "#REF!", "#NAME?", "#NUM!", "#NULL!"];

/** The longest text of a cell in worksheet files. */
export const longestText = 32_767;

/** A list of cells as a column. Plain values, which are nearly all, are taken without describing each one's place. */
export function readCells(part: Part, most: number): Column {
  if (!Array.isArray(part.value) || part.value.length > most) throw unlike(part, `a list of at most ${most} cells`);
  return columnOf(
    part.value.map((value, index): Cell => {
      if (value === null || typeof value === "boolean") return value;
      if (typeof value === "number" && Number.isFinite(value)) return value;
      const cell = { value, path: `${part.path}[${index}]` };
      return typeof value === "string" ? text(cell, longestText) : readSpecial(cell);
    }),
  );
}

function readSpecial(part: Part): Cell {
  const cell = anObject(part);
  if (member(cell, "number").value === "-0") return -0;
  const code = oneOf(member(cell, "error"), codes);
  return new CellError(code, text(member(cell, "topic"), longestText), text(member(cell, "message"), longestText));
}
