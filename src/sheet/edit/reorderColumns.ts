import type { SheetColumn } from "../book/book.js";
import { emptyColumn } from "../book/book.js";
import type { Edit } from "./draft.js";
import { withClaims } from "./insertColumns.js";
import { deletedRange } from "./structure/deletedRange.js";
import { freeSpills } from "./structure/freeSpills.js";
import { restructure } from "./structure/restructure.js";
import { sheetIndexIn } from "./structure/sheetIndex.js";

/**
 * Puts `count` columns from column `from` on before another column. References to cells in them follow; ranges that
 * reach over other columns too lose those that leave and take in those that come, as when columns are deleted and
 * inserted.
 */
export function reorderColumns(sheet: number, from: number, count: number, before: number): Edit {
  return (draft) => {
    const end = from + count;
    if (before >= from && before <= end) {
      return;
    }
    const target = before > from ? before - count : before;
    const withMoved = (column: number): number => (column >= target ? column + count : column);
    const shift = (column: number): number =>
      column >= from && column < end ? column - from + target : withMoved(column >= end ? column - count : column);
    const staysTogether = (column: number, width: number): boolean =>
      Array.from({ length: width }, (_, index) => shift(column + index) - index).every((at) => at === shift(column));
    freeSpills(draft, sheet, ({ width }, column) => !staysTogether(column, width));
    restructure(draft, {
      rule: {
        sheet,
        sheetIndex: sheetIndexIn(draft),
        rowCuts: [],
        move(area, { whole }) {
          if (whole === "rows") {
            return area;
          }
          if (area.left >= from && area.right < end) {
            return { ...area, left: shift(area.left), right: shift(area.right) };
          }
          const rest = deletedRange(area.left, area.right, from, count);
          return rest && { ...area, left: withMoved(rest[0]), right: withMoved(rest[1]) };
        },
        moveHome: (home) => (home.sheet === sheet ? { ...home, column: shift(home.column) } : home),
      },
      moveCells: (sheets) =>
        sheets.map((each, index) =>
          index === sheet ? { ...each, columns: reordered(each.columns, shift, Math.max(end, before)) } : each,
        ),
      moveSpan: (span) => [span.sheet === sheet ? { ...span, column: shift(span.column) } : span],
    });
    // A range that still names the same columns may hold them in another order.
    const { columns } = draft.session.snapshot().sheets[sheet] ?? { columns: [] };
    for (let column = Math.min(from, target); column < Math.max(end, before); column++) {
      const to = columns[column]?.cells.length ?? 0;
      if (to > 0) {
        draft.changed.push({ sheet, column, from: 0, to });
      }
    }
  };
}

function reordered(
  columns: readonly SheetColumn[],
  shift: (column: number) => number,
  least: number,
): readonly SheetColumn[] {
  const after: SheetColumn[] = [];
  for (let column = 0; column < Math.max(columns.length, least); column++) {
    after[shift(column)] = withClaims(columns[column] ?? emptyColumn, shift);
  }
  return after;
}
