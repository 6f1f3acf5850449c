import { parseA1Ref, stringifyA1Ref } from "@borgar/fx";
import type { Area } from "./worksheet.js";

/** Which edges of an address stay where they are when its formula is filled down. */
export type Fixed = "none" | "row" | "all";

/** "B2:C9"; with its sheet, "'My sheet'!B2:C9", where `home` is another one. */
export function areaText(area: Area, home: string = area.sheet, fixed: Fixed = "none"): string {
  const { sheet, row, column, rows, columns } = area;
  const [$row, $column] = [fixed !== "none", fixed === "all"];
  return stringifyA1Ref({
    context: sheet === home ? [] : [sheet],
    range: {
      top: row,
      left: column,
      bottom: row + rows - 1,
      right: column + columns - 1,
      $top: $row,
      $bottom: $row,
      $left: $column,
      $right: $column,
    },
  });
}

/** An address as typed or as the host gives it; undefined where the text is none, or names whole columns or rows. */
export function readArea(text: string, home: string): Area | undefined {
  const parsed = parseA1Ref(text.trim(), { allowNamed: false });
  if (!parsed || !("range" in parsed) || (parsed.context?.length ?? 0) > 1) return undefined;
  const { top, left, bottom, right } = parsed.range;
  if (top === null || left === null || top === undefined || left === undefined) return undefined;
  const [lastRow, lastColumn] = [bottom ?? top, right ?? left];
  return {
    sheet: parsed.context?.[0] ?? home,
    row: Math.min(top, lastRow),
    column: Math.min(left, lastColumn),
    rows: Math.abs(lastRow - top) + 1,
    columns: Math.abs(lastColumn - left) + 1,
  };
}

/** The one cell some rows and columns away from the first of an area. */
export function cellIn(area: Area, down = 0, right = 0): Area {
  return { sheet: area.sheet, row: area.row + down, column: area.column + right, rows: 1, columns: 1 };
}
