import type { Edit } from "./draft.js";
import { withClaims } from "./insertColumns.js";
import { deletedRange } from "./structure/deletedRange.js";
import { freeSpills } from "./structure/freeSpills.js";
import { restructure } from "./structure/restructure.js";
import { sheetIndexIn } from "./structure/sheetIndex.js";

/** Takes `count` columns out from column `at` on. References to what is gone become #REF!. */
export function deleteColumns(sheet: number, at: number, count: number): Edit {
  return (draft) => {
    const end = at + count;
    freeSpills(draft, sheet, ({ width }, column) => column < end && at < column + width);
    const shift = (column: number): number => (column >= end ? column - count : column);
    restructure(draft, {
      rule: {
        sheet,
        sheetIndex: sheetIndexIn(draft),
        rowCuts: [],
        move(area, { whole }) {
          const columns = whole === "rows" ? [area.left, area.right] : deletedRange(area.left, area.right, at, count);
          return columns && { ...area, left: columns[0] as number, right: columns[1] as number };
        },
        moveHome(home) {
          const gone = home.sheet === sheet && home.column >= at && home.column < end;
          return gone ? undefined : home.sheet === sheet ? { ...home, column: shift(home.column) } : home;
        },
      },
      moveCells: (sheets) =>
        sheets.map((each, index) =>
          index === sheet
            ? {
                ...each,
                columns: each.columns
                  .filter((_, column) => column < at || column >= end)
                  .map((column) => withClaims(column, shift)),
              }
            : each,
        ),
      moveSpan(span) {
        const gone = span.sheet === sheet && span.column >= at && span.column < end;
        return gone ? [] : [span.sheet === sheet ? { ...span, column: shift(span.column) } : span];
      },
    });
  };
}
