import type { Cell } from "../../call/cell.js";
import { cellAt } from "../../call/column.js";
import type { Area, Run } from "../book/book.js";
import type { Span } from "../book/spans.js";
import { mergeSpans, spanAt } from "../book/spans.js";
import { cellByCell } from "../evaluate/operateColumns.js";
import { contentOf } from "./content.js";
import type { Edit } from "./draft.js";
import { sameRun, writeContent } from "./draft.js";
import { placeFormula } from "./placeFormula.js";

/**
 * Repeats some rows of an area, in their turn, over other rows that need not lie together: formulas with their relative
 * references moving, values as they are.
 */
export function fillRows(area: Area, sources: readonly number[], targets: readonly Span[]): Edit {
  return (draft) => {
    const book = draft.session.snapshot();
    for (let column = area.left; column <= area.right; column++) {
      const { values, runs } = contentOf(book, area, column);
      const cells = sources.map((row): Cell => cellAt(values, row - area.top));
      const formulas = sources.map((row) => spanAt(runs, row)?.formula);
      let turn = 0;
      for (const { from, to } of targets) {
        const first = turn;
        const source = (row: number): number => (first + row) % sources.length;
        const literals = cellByCell(to - from, (row) => cells[source(row)] ?? null);
        const [only] = formulas;
        const filled: Run[] = [];
        if (sources.length === 1 && only !== undefined) {
          filled.push(...placeFormula(only, column, from, to));
        } else {
          for (let row = from; row < to; row++) {
            const formula = formulas[source(row - from)];
            filled.push(...(formula === undefined ? [] : placeFormula(formula, column, row, row + 1)));
          }
        }
        writeContent(draft, { sheet: area.sheet, column, from }, literals, mergeSpans(filled, sameRun));
        turn += to - from;
      }
    }
  };
}
