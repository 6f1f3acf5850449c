import { CellError } from "../../call/cell.js";
import { addressText } from "../book/address.js";
import type { Place } from "../book/book.js";
import { spanAt } from "../book/spans.js";
import { components } from "../depend/components.js";
import type { DirtyRun } from "../depend/propagate.js";
import { evaluateCell } from "../evaluate/evaluateCell.js";
import type { Scene } from "../evaluate/scene.js";
import type { Reference } from "../formula/reference.js";
import { resolve } from "../formula/reference.js";
import type { RowOrder } from "./inOrder.js";
import { rowOrder } from "./inOrder.js";
import { releaseSpills } from "./placeSpill.js";
import { referencesOf } from "./references.js";
import type { Session } from "./session.js";
import { writeOne } from "./writeRows.js";

/** Cells calculated between two looks at a wish to cancel: so many, or so long [ms]. */
const cellsTogether = 4096;
const longEnough = 30;

/** Says when it is time for such a look; called after every few cells. */
function startSlice(): (done: number) => boolean {
  const began = performance.now();
  return (done) => done >= cellsTogether || (done % 32 === 0 && performance.now() - began > longEnough);
}

/** Calculates runs that read themselves or each other: cell by cell, each after what it reads. */
export function* evaluateCircle(
  session: Session,
  circle: readonly DirtyRun[],
  settled: Place[],
): Generator<number, void> {
  const scenes = new Map(circle.map((run) => [run, sceneOf(session, run)]));
  const order = rowOrder(session, circle);
  const calculate = (run: DirtyRun, row: number): void =>
    writeOne(session, run, row, evaluateCell(run.run.formula.tree, scenes.get(run) as Scene, row));
  yield* order === undefined ? byCell(session, circle, calculate, settled) : byRow(order, calculate);
}

function sceneOf(session: Session, { sheet, column, run }: DirtyRun): Scene {
  return { world: session.world, formula: run.formula, sheet, column, known: undefined };
}

function* byRow(order: RowOrder, calculate: (run: DirtyRun, row: number) => void): Generator<number, void> {
  const { runs, downwards } = order;
  const first = Math.min(...runs.map(({ rows }) => rows[0]?.from ?? Number.POSITIVE_INFINITY));
  const end = Math.max(...runs.map(({ rows }) => rows.at(-1)?.to ?? 0));
  let done = 0;
  let isOver = startSlice();
  for (let step = 0; step < end - first; step++) {
    const row = downwards ? first + step : end - 1 - step;
    for (const run of runs) {
      if (spanAt(run.rows, row) !== undefined) {
        calculate(run, row);
        done++;
      }
    }
    if (isOver(done)) {
      yield done;
      done = 0;
      isOver = startSlice();
    }
  }
  yield done;
}

interface CircleCell {
  readonly run: DirtyRun;
  readonly row: number;
}

function* byCell(
  session: Session,
  circle: readonly DirtyRun[],
  calculate: (run: DirtyRun, row: number) => void,
  settled: Place[],
): Generator<number, void> {
  const cells = new Map<DirtyRun, CircleCell[]>();
  for (const run of circle) {
    const all: CircleCell[] = [];
    for (const { from, to } of run.rows) {
      for (let row = from; row < to; row++) {
        all.push({ run, row });
      }
    }
    cells.set(run, all);
  }
  const references = new Map(circle.map((run) => [run, referencesOf(session.world, run.run.formula)]));
  const readBy = (cell: CircleCell): CircleCell[] =>
    (references.get(cell.run) ?? []).flatMap((reference) => cellsRead(session, circle, cells, cell, reference));

  // Found from reader to read, so what is read first comes last.
  const groups = components([...cells.values()].flat(), readBy).reverse();
  let done = 0;
  let isOver = startSlice();
  for (const group of groups) {
    const [only] = group as [CircleCell];
    if (group.length === 1 && !readBy(only).includes(only)) {
      calculate(only.run, only.row);
    } else {
      nameCircle(session, group, readBy, settled);
    }
    done += group.length;
    if (isOver(done)) {
      yield done;
      done = 0;
      isOver = startSlice();
    }
  }
  yield done;
}

/** The dirty cells of the circle whose values, or whose filled cells, a reference reads. */
function cellsRead(
  session: Session,
  circle: readonly DirtyRun[],
  cells: ReadonlyMap<DirtyRun, readonly CircleCell[]>,
  { run, row }: CircleCell,
  reference: Reference,
): CircleCell[] {
  const sheet = reference.sheet === undefined ? run.sheet : session.world.sheetIndex(reference.sheet);
  const area = resolve(reference, row, run.column);
  const found: CircleCell[] = [];
  for (const other of circle) {
    if (other.sheet === sheet && other.column <= area.right) {
      const all = cells.get(other) ?? [];
      if (other.column >= area.left) {
        found.push(...between(all, area.top, area.bottom));
      }
      for (const spill of session.peek(sheet, other.column).spills) {
        if (!spill.blocked && other.column + spill.width > area.left) {
          const first = Math.max(spill.from, area.top - spill.rows + 1);
          found.push(...between(all, first, Math.min(spill.to - 1, area.bottom)));
        }
      }
    }
  }
  return found;
}

/** The cells, which are in the order of their rows, from row `first` to row `last`. */
function between(cells: readonly CircleCell[], first: number, last: number): readonly CircleCell[] {
  let low = 0;
  let high = cells.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((cells[middle] as CircleCell).row < first) {
      low = middle + 1;
    } else {
      high = middle;
    }
  }
  let end = low;
  while (end < cells.length && (cells[end] as CircleCell).row <= last) {
    end++;
  }
  return cells.slice(low, end);
}

/** Every cell of a circle holds the circle as its error. */
function nameCircle(
  session: Session,
  group: readonly CircleCell[],
  readBy: (cell: CircleCell) => CircleCell[],
  settled: Place[],
): void {
  const filling = group.some(({ run, row }) => spanAt(session.peek(run.sheet, run.column).spills, row) !== undefined);
  const describeNow = (): string => describe(session, shortestCircle(group, readBy));
  // What fills other cells is about to take them back, and with them the circle: it is described while it is there.
  const error = new CellError("#VALUE!", "a circle of formulas", filling ? describeNow() : describeNow);
  for (const { run, row } of group) {
    const { sheet, column } = run;
    if (spanAt(session.peek(sheet, column).spills, row) !== undefined) {
      releaseSpills(session, run, row, row + 1);
      settled.push({ sheet, column, row });
    }
    session.column(run.sheet, run.column).cells.write(row, error);
  }
}

function shortestCircle(group: readonly CircleCell[], readBy: (cell: CircleCell) => CircleCell[]): CircleCell[] {
  const inside = new Set(group);
  const start = group.reduce((first, each) =>
    each.row < first.row || (each.row === first.row && each.run.column < first.run.column) ? each : first,
  );
  const cameFrom = new Map<CircleCell, CircleCell>();
  const queue = [start];
  for (const cell of queue) {
    for (const next of readBy(cell)) {
      if (next === start) {
        const path = [cell];
        for (let at = cell; at !== start; path.push(at)) {
          at = cameFrom.get(at) as CircleCell;
        }
        return path.reverse();
      }
      if (inside.has(next) && !cameFrom.has(next)) {
        cameFrom.set(next, cell);
        queue.push(next);
      }
    }
  }
  return [start];
}

const mostNamed = 8;

function describe(session: Session, path: readonly CircleCell[]): string {
  const sheets = new Set(path.map(({ run }) => run.sheet));
  const address = ({ run, row }: CircleCell): string =>
    addressText(row, run.column, sheets.size > 1 ? session.sheetName(run.sheet) : undefined);
  const named = path.map(address);
  const shown = named.length <= mostNamed ? named : [...named.slice(0, mostNamed - 1), "...", named.at(-1) as string];
  return `the formula depends on itself: ${[...shown, named[0]].join(" -> ")}; a formula that reads none of these cells is needed in one of them`;
}
