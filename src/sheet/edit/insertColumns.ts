import type { Claim, SheetColumn } from "../book/book.js";
import { emptyColumn } from "../book/book.js";
import { columnsInUse } from "../book/usedRows.js";
import { mostColumns } from "../limits.js";
import type { Edit } from "./draft.js";
import { EditRefused } from "./refused.js";
import { freeSpills } from "./structure/freeSpills.js";
import { restructure } from "./structure/restructure.js";
import { sheetIndexIn } from "./structure/sheetIndex.js";

/** Puts `count` blank columns in before column `at`; what was there moves right and every reference with it. */
export function insertColumns(sheet: number, at: number, count: number): Edit {
  return (draft) => {
    const used = columnsInUse(draft.session.snapshot().sheets[sheet]);
    if (at < used && used + count > mostColumns) {
      throw new EditRefused(
        `insert columns: ${used} columns and ${count} more are more than ${mostColumns}; fewer columns are needed, or columns deleted before`,
      );
    }
    freeSpills(draft, sheet, ({ width }, column) => column < at && at < column + width);
    const shift = (column: number): number => (column >= at ? column + count : column);
    restructure(draft, {
      rule: {
        sheet,
        sheetIndex: sheetIndexIn(draft),
        rowCuts: [],
        move: (area, { whole }) =>
          whole === "rows"
            ? area
            : { ...area, left: shift(area.left), right: Math.min(shift(area.right), mostColumns - 1) },
        moveHome: (home) => (home.sheet === sheet ? { ...home, column: shift(home.column) } : home),
      },
      moveCells: (sheets) =>
        sheets.map((each, index) => (index === sheet ? { ...each, columns: spread(each.columns, at, count) } : each)),
      moveSpan: (span) => [span.sheet === sheet ? { ...span, column: shift(span.column) } : span],
    });
  };
}

function spread(columns: readonly SheetColumn[], at: number, count: number): SheetColumn[] {
  const shifted = columns.map((column) => withClaims(column, (each) => (each >= at ? each + count : each)));
  return at >= columns.length
    ? shifted
    : [...shifted.slice(0, at), ...new Array<SheetColumn>(count).fill(emptyColumn), ...shifted.slice(at)];
}

/** A column whose claims name their formulas' columns after a move. */
export function withClaims(column: SheetColumn, shift: (column: number) => number): SheetColumn {
  if (column.claims.length === 0) {
    return column;
  }
  return { ...column, claims: column.claims.map((claim): Claim => ({ ...claim, column: shift(claim.column) })) };
}
