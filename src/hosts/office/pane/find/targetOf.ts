import { takesResult } from "../../../../functions/argumentNames.js";
import { areaText, readArea } from "../areaText.js";
import { columnAt, isInRows } from "../sheetTable.js";
import type { Area } from "../worksheet.js";
import { type CallFields, readField } from "./callFields.js";
import type { BuildState } from "./findState.js";
import { type Target, targetRows } from "./insertCall.js";
import { resultHeaders } from "./resultHeaders.js";

/** Where the formula and its headers go; undefined where the target is no cell. */
export function targetOf(build: BuildState): Target | undefined {
  const { table, fields } = build;
  const area = readArea(build.target, fields.sheet);
  if (!area) return undefined;
  const rows = targetRows(area, table, build.fillsDown);
  const columns = build.preview?.cells.length ?? 1;
  const headerCell = freeHeaderCell(build, rows.cell);
  const writes = build.writesHeader && headerCell !== undefined;
  const unit = build.preview?.unit ?? (fields.result.trim() || undefined);
  return { ...rows, columns, headerCell, headers: writes ? resultHeaders(fields.definition, unit, columns) : [] };
}

/** The cell above the target in the row of headers, where it is blank. */
function freeHeaderCell({ table }: BuildState, cell: Area): Area | undefined {
  if (!table || !isInRows(table, cell) || columnAt(table, cell.column)) return undefined;
  return { ...cell, row: table.used.area.row + table.plan.headerRow };
}

/** The call as it is inserted: where a header is written above, the formula takes the unit from there. */
export function callOf(build: BuildState): CallFields {
  const { fields } = build;
  if (!takesResult(fields.definition)) return { ...fields, result: "" };
  const target = targetOf(build);
  const isDefault = fields.definition.form === "number" && fields.result.trim() === fields.definition.result.unit;
  const isUnit = readField(fields.result, fields.sheet).is === "text";
  if (isUnit && target?.headerCell && target.headers.length > 0) {
    return { ...fields, result: areaText(target.headerCell, fields.sheet, "row") };
  }
  return isDefault ? { ...fields, result: "" } : fields;
}
