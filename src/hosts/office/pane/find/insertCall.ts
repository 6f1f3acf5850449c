import type { Cell } from "../../../../call/cell.js";
import { areaText, cellIn } from "../areaText.js";
import { dataArea, isInRows, type SheetTable } from "../sheetTable.js";
import type { Area, Worksheet } from "../worksheet.js";
import type { CallFields } from "./callFields.js";
import { callFormula } from "./callFormula.js";

/** Where a call goes: a cell, or the column of that cell over all rows of the table. */
export interface Target {
  /** The cell of the first formula. */
  readonly cell: Area;
  readonly rows: number;
  /** The headers that are written above, the value's and those of its uncertainties; none where they are there. */
  readonly headers: readonly string[];
  readonly headerCell: Area | undefined;
  /** How many columns the result fills. */
  readonly columns: number;
}

/** The cells a formula put at `cell` fills: with `fillsDown`, from the first row of the table to its last. */
export function targetRows(
  cell: Area,
  table: SheetTable | undefined,
  fillsDown: boolean,
): Pick<Target, "cell" | "rows"> {
  if (!table || !isInRows(table, cell)) return { cell: cellIn(cell), rows: 1 };
  const data = dataArea(table);
  return { cell: { ...cellIn(cell), row: data.row }, rows: fillsDown ? data.rows : 1 };
}

/** The cells that would be written over, as an address; undefined where all of them are blank. */
export async function occupied(worksheet: Worksheet, target: Target): Promise<string | undefined> {
  const { cell, rows, columns, headers, headerCell } = target;
  const area = { ...cell, rows, columns };
  const above = headerCell && headers.length > 0 ? [{ ...headerCell, columns: headers.length }] : [];
  const answers = await worksheet.read([area, ...above]);
  const full = answers.find((answer) => answer?.values.some((row) => row.some((value) => value !== null)));
  return full && areaText(full.area, cell.sheet);
}

/** Writes the headers and the formula and fills it down; the address that was filled comes back. */
export async function insertCall(worksheet: Worksheet, fields: CallFields, target: Target): Promise<string> {
  const { cell, rows, headers, headerCell } = target;
  if (headerCell && headers.length > 0) {
    const row: readonly Cell[] = headers;
    await worksheet.write({ ...headerCell, columns: headers.length }, [row]);
  }
  await worksheet.insertFormula(cell, callFormula(fields));
  const filled = { ...cell, rows };
  if (rows > 1) await worksheet.fillDown(filled);
  await worksheet.goTo(filled);
  return areaText(filled);
}
