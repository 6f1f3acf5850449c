import type { SheetColumn } from "./book.js";
import { spanAt } from "./spans.js";

/** The rectangle that the formula in a row of a column fills, where it fills more than its cell. */
export function spillSize(
  column: Pick<SheetColumn, "spills">,
  row: number,
): { readonly rows: number; readonly width: number } | undefined {
  const spill = spanAt(column.spills, row);
  return spill === undefined || spill.blocked ? undefined : { rows: spill.rows, width: spill.width };
}
