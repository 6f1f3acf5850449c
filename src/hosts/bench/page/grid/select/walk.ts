import type { Area } from "../../../../../sheet/book/book.js";
import type { ColumnAxis } from "../layout/columnAxis.js";
import type { RowAxis } from "../layout/rowAxis.js";
import type { Spot } from "../layout/sight.js";

/**
 * The next cell inside an area, along its rows or down its columns, from its end to its start again. Hidden columns
 * and filtered rows are passed over. Rows of the area are rows of the sheet, those of spots rows in view.
 */
export function walk(
  area: Area,
  from: Spot,
  { down, backwards }: { readonly down: boolean; readonly backwards: boolean },
  columns: Pick<ColumnAxis, "widthOf" | "count">,
  rows: Pick<RowAxis, "toView" | "lastInView" | "count">,
): Spot {
  const top = rows.toView(area.top);
  const bottom = Math.min(rows.lastInView(area.bottom), rows.count - 1);
  const right = Math.min(area.right, columns.count - 1);
  const seen: number[] = [];
  for (let column = area.left; column <= right; column++) if (columns.widthOf(column) > 0) seen.push(column);
  const height = bottom - top + 1;
  if (seen.length === 0 || height <= 0) return from;
  const across = Math.max(seen.indexOf(from.column), 0);
  const along = Math.min(Math.max(from.row - top, 0), height - 1);
  const total = height * seen.length;
  const index = down ? across * height + along : along * seen.length + across;
  const next = (index + (backwards ? total - 1 : 1)) % total;
  return down
    ? { row: top + (next % height), column: seen[Math.floor(next / height)] as number }
    : { row: top + Math.floor(next / seen.length), column: seen[next % seen.length] as number };
}
