import { cutSpans } from "../book/spans.js";
import type { Edit } from "./draft.js";
import { deletedRange } from "./structure/deletedRange.js";
import { freeSpills } from "./structure/freeSpills.js";
import { restructure } from "./structure/restructure.js";
import { sheetIndexIn } from "./structure/sheetIndex.js";
import { deleteFromColumn, shiftSpans } from "./structure/shiftRows.js";

/** Takes `count` rows out from row `at` on; what is below moves up. References to what is gone become #REF!. */
export function deleteRows(sheet: number, at: number, count: number): Edit {
  return (draft) => {
    const end = at + count;
    freeSpills(draft, sheet, ({ from, to, rows }) => rows > 1 && from < end && at < to + rows - 1);
    restructure(draft, {
      rule: {
        sheet,
        sheetIndex: sheetIndexIn(draft),
        rowCuts: [at, end],
        gone: { from: at, to: end },
        move(area, { whole }) {
          const rows = whole === "columns" ? [area.top, area.bottom] : deletedRange(area.top, area.bottom, at, count);
          return rows && { ...area, top: rows[0] as number, bottom: rows[1] as number };
        },
        moveHome(home) {
          if (home.sheet !== sheet || home.row < at) {
            return home;
          }
          return home.row < end ? undefined : { ...home, row: home.row - count };
        },
      },
      moveCells: (sheets) =>
        sheets.map((each, index) =>
          index === sheet
            ? { ...each, columns: each.columns.map((column) => deleteFromColumn(column, at, count)) }
            : each,
        ),
      moveSpan: (span) => (span.sheet === sheet ? shiftSpans(cutSpans([span], at, end), end, -count) : [span]),
    });
  };
}
