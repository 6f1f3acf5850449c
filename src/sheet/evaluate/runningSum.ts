import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import type { Column } from "../../call/column.js";
import { cellAt } from "../../call/column.js";
import type { Node } from "../formula/node.js";
import { resolveBound } from "../formula/reference.js";
import { cellByCell } from "./operateColumns.js";
import type { RunningTotal, Stretch } from "./stretch.js";

/** Fewer rows than this are summed one by one. */
const fewRows = 16;

/**
 * SUM(B$2:B2) filled down: every row adds to the sum of the row before, in the same steps as a sum from the start, so
 * to the same bits, in one pass instead of one a row. Undefined for anything else.
 */
export function runningSum(node: Extract<Node, { kind: "worksheet" }>, stretch: Stretch): Column | undefined {
  const [only] = node.parameters;
  if (node.called.name !== "SUM" || node.parameters.length !== 1 || only?.kind !== "reference") {
    return undefined;
  }
  const reference = stretch.formula.references[only.index];
  const rows = stretch.to - stretch.from;
  if (reference === undefined || reference.whole || !reference.top.fixed || reference.bottom.fixed || rows < fewRows) {
    return undefined;
  }
  const { world, column } = stretch;
  const at = resolveBound(reference.left, column);
  const top = reference.top.at;
  const firstEnd = stretch.from + reference.bottom.at + 1;
  const sheet = reference.sheet === undefined ? stretch.sheet : world.sheetIndex(reference.sheet);
  if (at !== resolveBound(reference.right, column) || sheet < 0 || firstEnd <= top) {
    return undefined;
  }
  const known = stretch.running.get(node);
  const state =
    known !== undefined && known.next <= firstEnd ? known : { next: top, total: 0, carry: 0, error: undefined };
  stretch.running.set(node, state);
  const begin = state.next;
  const cells = world.slice(sheet, at, begin, firstEnd + rows - 1);
  return sums(state, (row) => cellAt(cells, row - begin), firstEnd, rows);
}

function sums(state: RunningTotal, cellOf: (row: number) => Cell, firstEnd: number, rows: number): Column | undefined {
  let overflow = false;
  const column = cellByCell(rows, (row): Cell => {
    for (; state.next < firstEnd + row; state.next++) {
      add(state, cellOf(state.next));
    }
    overflow ||= !Number.isFinite(state.total + state.carry);
    return state.error ?? state.total + state.carry;
  });
  // What overflowed is for the function itself to explain.
  return overflow ? undefined : column;
}

function add(state: RunningTotal, cell: Cell): void {
  if (cell instanceof CellError) {
    state.error ??= cell;
  } else if (typeof cell === "number" && state.error === undefined) {
    const { total } = state;
    const longer = total + cell;
    state.carry += Math.abs(total) >= Math.abs(cell) ? total - longer + cell : cell - longer + total;
    state.total = longer;
  }
}
