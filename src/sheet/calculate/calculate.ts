import type { Book, Place, Run } from "../book/book.js";
import type { Span } from "../book/spans.js";
import { cutSpans, rowsOutside } from "../book/spans.js";
import { components } from "../depend/components.js";
import type { Dirty, DirtyRun, IsFresh } from "../depend/propagate.js";
import { propagate } from "../depend/propagate.js";
import { findReadersIn } from "../depend/readers.js";
import { evaluateCircle } from "./evaluateCircle.js";
import { evaluateRun } from "./evaluateRun.js";
import { openSession } from "./session.js";

/** Formula cells done, of those known to be needed. */
export interface Progress {
  readonly done: number;
  readonly total: number;
}

/** After this many rounds results of several cells are refused: their own size depends on what they fill. */
const patientRounds = 100;

/**
 * Calculates what is dirty, slice by slice, and returns the whole book. The book given stays as it is, so whoever
 * stops asking for the next slice still has it. A result may fill cells that others read: they follow in another round.
 */
export function* calculate(book: Book, dirty: Dirty): Generator<Progress, Book> {
  const findReaders = findReadersIn(book);
  const settled: Place[] = [];
  let current = book;
  let next = dirty;
  let done = 0;
  let isFresh: IsFresh = () => false;
  for (let round = 0; ; round++) {
    const runs = propagate(current, findReaders, next, isFresh);
    leaveSettled(runs, settled);
    if (runs.length === 0) {
      return current;
    }
    const session = openSession(current);
    session.refusesSpills = round >= patientRounds;
    const total = runs.reduce((sum, run) => sum + rowCount(run), done);
    const groups = new Map<Run, { readonly group: number; readonly rows: readonly Span[] }>();
    for (const members of components(fromTheRight(runs), (run) => run.readers)) {
      session.group++;
      for (const { run, rows } of members) {
        groups.set(run, { group: session.group, rows });
      }
      const [only] = members as [DirtyRun];
      const alone = members.length === 1 && !only.readers.has(only);
      for (const rows of alone ? evaluateRun(session, only) : evaluateCircle(session, members, settled)) {
        done += rows;
        yield { done, total };
      }
    }
    current = session.snapshot();
    if (session.touched.length === 0) {
      return current;
    }
    next = { changed: session.touched, stale: [] };
    isFresh = (run, rows, group) => {
      const last = groups.get(run);
      return last !== undefined && last.group > group && rowsOutside(last.rows, rows.from, rows.to).length === 0;
    };
  }
}

function rowCount(run: DirtyRun): number {
  return run.rows.reduce((sum, { from, to }) => sum + to - from, 0);
}

/** The components come out the other way round: what is independent is calculated from left to right, as results spill. */
function fromTheRight(runs: readonly DirtyRun[]): DirtyRun[] {
  return runs.toSorted((a, b) => b.sheet - a.sheet || b.column - a.column || b.run.from - a.run.from);
}

/** Cells that were found to read what they fill keep their error for the rest of the calculation. */
function leaveSettled(runs: readonly DirtyRun[], settled: readonly Place[]): void {
  for (const run of settled.length === 0 ? [] : runs) {
    for (const { sheet, column, row } of settled) {
      if (sheet === run.sheet && column === run.column) {
        run.rows = cutSpans(run.rows, row, row + 1);
      }
    }
  }
}
