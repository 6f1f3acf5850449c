import { type Cell, CellError } from "../../call/cell.js";

/** A cell as a person reads it; a blank is empty. */
export function cellText(cell: Cell): string {
  if (cell === null) return "";
  if (cell instanceof CellError) return cell.code;
  if (typeof cell === "boolean") return cell ? "TRUE" : "FALSE";
  return String(cell);
}

/** A value, its uncertainties and its unit. */
export function quantityText(cells: readonly Cell[], unit: string): string {
  const [value, upper, lower] = cells;
  const sigma =
    upper === undefined || upper === null
      ? ""
      : lower === undefined
        ? ` \u00b1 ${cellText(upper)}`
        : ` +${cellText(upper)} -${cellText(lower)}`;
  return `${cellText(value ?? null)}${sigma}${unit === "1" ? "" : ` ${unit}`}`;
}
