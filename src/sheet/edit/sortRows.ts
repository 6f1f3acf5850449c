import type { Column } from "../../call/column.js";
import type { Area, Run } from "../book/book.js";
import { mergeSpans, spansIn } from "../book/spans.js";
import { releaseSpills } from "../calculate/placeSpill.js";
import type { Draft, Edit } from "./draft.js";
import { sameRun, writeContent } from "./draft.js";
import { orderRows, type SortKey } from "./orderRows.js";
import { placeFormula } from "./placeFormula.js";
import { EditRefused } from "./refused.js";

/**
 * Sorts the rows of an area by columns of it; rows that are equal keep their order. Formulas go with their rows and
 * what they refer to relatively stays as far away, so what is in the same row stays in the same row.
 */
export function sortRows(area: Area, keys: readonly SortKey[]): Edit {
  const sort = (draft: Draft): void => {
    const { sheet, top, bottom, left, right } = area;
    const { world } = draft.session;
    const end = bottom + 1;
    const columnsOfKeys = keys.map(({ column }) => world.slice(sheet, column, top, end));
    const order = orderRows(keys, columnsOfKeys);
    refuseFilled(draft, area);
    for (let column = left; column <= right; column++) {
      releaseSpills(draft.session, { sheet, column }, top, end);
    }
    for (let column = left; column <= right; column++) {
      if (draft.session.column(sheet, column).cells.length() > top) {
        const runs = spansIn(draft.session.peek(sheet, column).runs, top, end);
        const values = world.slice(sheet, column, top, end);
        const calculated = runs.length === 1 && coversAll(runs[0] as Run, top, end);
        const sorted = calculated ? values : gather(values, order);
        writeContent(draft, { sheet, column, from: top }, sorted, reorderRuns(runs, column, top, end, order));
      }
    }
  };
  return Object.assign(sort, { readsValues: true });
}

/** Rows of a spill are not somebody's to sort, unless they lie beside its own formulas. */
function refuseFilled(draft: Draft, { sheet, top, bottom, left, right }: Area): void {
  for (let column = left; column <= right; column++) {
    const foreign = spansIn(draft.session.peek(sheet, column).claims, top, bottom + 1).some(
      (claim) => claim.row !== undefined || claim.column < left || claim.column > right,
    );
    if (foreign) {
      throw new EditRefused(
        "sort: some of the cells are filled by one formula; sort the cells that the formula reads, or paste its values first",
      );
    }
  }
}

function coversAll(run: Run, from: number, to: number): boolean {
  return run.from <= from && run.to >= to;
}

function gather(column: Column, order: Int32Array): Column {
  const numbers = new Float64Array(order.length);
  for (let row = 0; row < order.length; row++) {
    numbers[row] = column.numbers[order[row] as number] as number;
  }
  const { others } = column;
  return {
    length: order.length,
    numbers,
    others: others === undefined ? undefined : Array.from(order, (row) => others[row]),
  };
}

function reorderRuns(
  runs: readonly Run[],
  column: number,
  from: number,
  to: number,
  order: Int32Array,
): readonly Run[] {
  const [only] = runs;
  if (only === undefined || (runs.length === 1 && coversAll(only, from, to))) {
    return only === undefined ? [] : [{ ...only, from, to }];
  }
  const formulaAt = new Int32Array(to - from).fill(-1);
  for (const [index, run] of runs.entries()) {
    formulaAt.fill(index, Math.max(0, run.from - from), Math.min(to, run.to) - from);
  }
  const moved: Run[] = [];
  for (let row = 0; row < order.length; row++) {
    const run = runs[formulaAt[order[row] as number] as number];
    if (run !== undefined) {
      moved.push(...placeFormula(run.formula, column, from + row, from + row + 1));
    }
  }
  return mergeSpans(moved, sameRun);
}
