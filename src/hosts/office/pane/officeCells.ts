import { type Cell, CellError, type ErrorCode } from "../../../call/cell.js";

const codes: ReadonlySet<string> = new Set(["#VALUE!", "#N/A", "#DIV/0!", "#REF!", "#NAME?", "#NUM!", "#NULL!"]);

/** A cell as the host's ranges show it: errors are their codes as texts, blanks are empty texts. */
export function cellOfOffice(value: unknown): Cell {
  if (typeof value === "number") return Number.isFinite(value) ? value : null;
  if (typeof value === "boolean") return value;
  if (value === null || value === undefined || value === "") return null;
  const text = String(value);
  if (codes.has(text)) return new CellError(text as ErrorCode, "in the worksheet", text);
  // Errors of the host alone, such as that of a blocked spill, have no code in the standard.
  return /^#[A-Z]+!$/.test(text) ? new CellError("#VALUE!", text, text) : text;
}

/** What is written to a cell: a text is kept a text, whatever it begins with. */
export function officeOfCell(cell: Cell): string | number | boolean {
  if (cell === null) return "";
  if (cell instanceof CellError) return `'${cell.code}`;
  return typeof cell === "string" && /^[=+\-@']/.test(cell) ? `'${cell}` : cell;
}
