import { usedRows } from "../book/usedRows.js";
import { mostRows } from "../limits.js";
import type { Edit } from "./draft.js";
import { EditRefused } from "./refused.js";
import { freeSpills } from "./structure/freeSpills.js";
import { restructure } from "./structure/restructure.js";
import { sheetIndexIn } from "./structure/sheetIndex.js";
import { insertIntoColumn, shiftSpans } from "./structure/shiftRows.js";

/** Puts `count` blank rows in before row `at`; what was there moves down and every reference with it. */
export function insertRows(sheet: number, at: number, count: number): Edit {
  return (draft) => {
    const used = usedRows(draft.session.snapshot(), sheet);
    if (at < used && used + count > mostRows) {
      throw new EditRefused(
        `insert rows: ${used} rows and ${count} more are more than ${mostRows}; fewer rows are needed, or rows deleted before`,
      );
    }
    freeSpills(draft, sheet, ({ from, to, rows }) => rows > 1 && from < at && at < to + rows - 1);
    const shift = (row: number): number => (row >= at ? row + count : row);
    restructure(draft, {
      rule: {
        sheet,
        sheetIndex: sheetIndexIn(draft),
        rowCuts: [at],
        move: (area, { whole }) =>
          whole === "columns"
            ? area
            : { ...area, top: shift(area.top), bottom: Math.min(shift(area.bottom), mostRows - 1) },
        moveHome: (home) => (home.sheet === sheet ? { ...home, row: shift(home.row) } : home),
      },
      moveCells: (sheets) =>
        sheets.map((each, index) =>
          index === sheet
            ? { ...each, columns: each.columns.map((column) => insertIntoColumn(column, at, count)) }
            : each,
        ),
      moveSpan: (span) => (span.sheet === sheet ? shiftSpans([span], at, count) : [span]),
    });
  };
}
