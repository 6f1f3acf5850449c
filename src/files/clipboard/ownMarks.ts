import type { Cell, ErrorCode } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import { readNumber } from "../cell/readNumber.js";

/** Attributes by which a table copied from here says what its cells hold to the last bit. */
export const marks = {
  /** Of the table: the address of its first cell, from where relative references count. */
  origin: "data-barycell-origin",
  kind: "data-barycell-kind",
  value: "data-barycell-value",
  formula: "data-barycell-formula",
} as const;

export function markOf(cell: Cell): readonly [kind: string, value: string] {
  if (cell === null) {
    return ["blank", ""];
  }
  if (cell instanceof CellError) {
    return ["error", cell.code];
  }
  switch (typeof cell) {
    case "number":
      return ["number", Object.is(cell, -0) ? "-0" : String(cell)];
    case "string":
      return ["text", cell];
    default:
      return ["logical", cell ? "TRUE" : "FALSE"];
  }
}

const codes: ReadonlySet<string> = new Set(["#VALUE!", "#N/A", "#DIV/0!", "#REF!", "#NAME?", "#NUM!", "#NULL!"]);

/** The cell of a mark; undefined where the mark is none of ours. */
export function cellOfMark(kind: string | undefined, value: string): Cell | undefined {
  switch (kind) {
    case "blank":
      return null;
    case "text":
      return value;
    case "logical":
      return value === "TRUE" ? true : value === "FALSE" ? false : undefined;
    case "number":
      return readNumber(value) ?? exactNumber(value);
    case "error":
      return codes.has(value)
        ? new CellError(
            value as ErrorCode,
            `${value} that was copied`,
            `${value} was copied as it stood; type what belongs here`,
          )
        : undefined;
    default:
      return undefined;
  }
}

/** A long integer that is a number and no identifier: the mark says so. */
function exactNumber(text: string): number | undefined {
  const value = /^-?\d+$/.test(text) ? Number(text) : Number.NaN;
  return Number.isFinite(value) ? value : undefined;
}
