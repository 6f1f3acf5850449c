import { type Cell, CellError } from "../call/cell.js";
import { cellAt, columnOf } from "../call/column.js";
import type { TableColumn } from "../table/checkTable.js";
import { inputColumns } from "./planColumns.js";
import { planInputs } from "./planQuantities.js";
import { readCells } from "./readOption.js";
import type { SkyTarget } from "./skyTarget.js";

export interface SkyRows {
  readonly targets: readonly (SkyTarget & { readonly row: number })[];
  /** Sentences on rows that have no place in the sky. */
  readonly problems: readonly string[];
}

/** Where the targets of some rows of a table stand; a sentence where it has no columns for that. */
export function skyTargets(
  table: readonly TableColumn[],
  named: ReadonlyMap<string, string>,
  rows: readonly number[],
): SkyRows | { readonly problem: string } {
  const places = inputColumns(table, { named });
  if ("problem" in places) return places;
  const [rightAscensions, declinations] = (["rightAscension", "declination"] as const).map((key) => {
    const column = table[places.inputs.get(key)?.[0] ?? -1];
    if (!column) return undefined;
    const cells = columnOf(rows.map((row) => cellAt(column.column, row)));
    const header = column.unitCell === undefined ? column.header : `${column.header} [${column.unitCell}]`;
    return readCells(planInputs[key], cells, header);
  });
  if (!rightAscensions || !declinations) {
    return { problem: "no columns of RA and dec were recognised; head them for example RA [h] and Dec [deg]." };
  }
  const targets: (SkyTarget & { row: number })[] = [];
  const problems: string[] = [];
  for (const [index, row] of rows.entries()) {
    const name = targetName(table, places.name, row);
    const [rightAscension, declination] = [rightAscensions[index]!, declinations[index]!];
    const wrong = [rightAscension, declination].find((one) => typeof one !== "number");
    if (typeof rightAscension === "number" && typeof declination === "number") {
      targets.push({ row, name, rightAscension, declination });
    } else if (typeof wrong === "object") problems.push(`${name}: ${wrong.problem}`);
  }
  return { targets, problems };
}

/** What a row is called: the text in the column of names, or its number. */
export function targetName(table: readonly TableColumn[], column: number | undefined, row: number): string {
  const cell: Cell = column === undefined ? null : cellAt(table[column]!.column, row);
  const text = cell === null || cell instanceof CellError ? "" : String(cell).trim();
  return text === "" ? `row ${row + 1}` : text;
}
