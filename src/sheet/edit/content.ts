import type { Column } from "../../call/column.js";
import { cellAt } from "../../call/column.js";
import type { Area, Book, Run } from "../book/book.js";
import { columnAt } from "../book/book.js";
import { sliceCells } from "../book/cells.js";
import { clipSpans, spanAt, spansIn } from "../book/spans.js";
import { cellByCell } from "../evaluate/operateColumns.js";

/** What stands in some rows of a column: formulas, and values in all other rows. */
export interface Content {
  readonly values: Column;
  readonly runs: readonly Run[];
}

/** The content of one column of an area. Cells that a formula of the area fills count as blank: it fills them again. */
export function contentOf(book: Book, area: Area, column: number): Content {
  const from = area.top;
  const to = area.bottom + 1;
  const { cells, runs, claims } = columnAt(book, area.sheet, column);
  const slice = sliceCells(cells, from, to);
  const filled = spansIn(claims, from, to).filter((claim) => claim.column >= area.left && claim.column <= area.right);
  const inside = (row: number): boolean => {
    const claim = spanAt(filled, row);
    return claim !== undefined && (claim.row === undefined || (claim.row >= from && claim.row < to));
  };
  const values =
    filled.length === 0 ? slice : cellByCell(slice.length, (row) => (inside(from + row) ? null : cellAt(slice, row)));
  return { values, runs: clipSpans(runs, from, to) };
}
