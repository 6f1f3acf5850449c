import { takesResult } from "../../../../functions/argumentNames.js";
import type { Definition } from "../../../../functions/definition.js";
import { readHeader } from "../../../../units/readHeader.js";
import { cellIn } from "../areaText.js";
import { columnAt, dataArea, freeColumn, isInRows, type SheetTable } from "../sheetTable.js";
import type { Area } from "../worksheet.js";

/** Where the formula goes at first: the selected cell where it is free of the table, else the next free column. */
export function firstTarget(table: SheetTable | undefined, selection: Area): Area {
  const cell = cellIn(selection);
  if (!table || table.used.area.sheet !== cell.sheet) return cell;
  if (isInRows(table, cell) && !columnAt(table, cell.column)) return cell;
  return { ...cell, row: dataArea(table).row, column: freeColumn(table) };
}

/** The unit that the header of the target's column states, else the function's own. */
export function ownUnit(definition: Definition, table: SheetTable | undefined, target: Area): string {
  if (!takesResult(definition)) return "";
  const header = table && columnAt(table, target.column);
  const stated = header && readHeader(header.unitCell ?? header.header).unit;
  if (stated) return stated.text;
  return definition.form === "number" && definition.result.unit !== "1" ? definition.result.unit : "";
}
