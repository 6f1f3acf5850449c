import { offsetAddress } from "./address.js";
import type { HeaderCell } from "./callProblem.js";
import type { Cell } from "./cell.js";
import type { Argument } from "./cellFunction.js";
import { cellsOf } from "./column.js";

/** The header cells of an argument: those of a range, or the parts of a text list `"d; solMass; earthMass"`. */
export function headerCells(argument: Argument): readonly HeaderCell[] {
  if (!argument) return [];
  const { block, address } = argument;
  const cells = cellsOf(block).flatMap((row, rowIndex) =>
    row.map((cell, columnIndex) => headerCell(cell, address && offsetAddress(address, rowIndex, columnIndex))),
  );
  const [only] = cells;
  if (cells.length !== 1 || !only?.text.includes(";")) return cells;
  return only.text.split(";").map((text) => ({ ...only, text: text.trim() }));
}

function headerCell(cell: Cell, address: string | undefined): HeaderCell {
  const isNumber = typeof cell === "number";
  const text = cell === null ? "" : typeof cell === "object" ? cell.code : String(cell);
  return { text, address, isNumber };
}
