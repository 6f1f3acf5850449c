import type { Area } from "../book/book.js";
import { blankColumn } from "../book/cells.js";
import { spansIn } from "../book/spans.js";
import type { Draft, Edit } from "./draft.js";
import { writeContent } from "./draft.js";

/** Empties an area: values and formulas. */
export function clearCells(area: Area): Edit {
  return (draft) => {
    for (let column = area.left; column <= area.right; column++) {
      clearSpan(draft, area.sheet, column, area.top, area.bottom + 1);
    }
  };
}

function clearSpan(draft: Draft, sheet: number, column: number, from: number, end: number): void {
  const { runs } = draft.session.peek(sheet, column);
  const inUse = Math.max(draft.session.column(sheet, column).cells.length(), spansIn(runs, from, end).at(-1)?.to ?? 0);
  const to = Math.min(end, inUse);
  if (from < to) {
    writeContent(draft, { sheet, column, from }, blankColumn(to - from), []);
  }
}
