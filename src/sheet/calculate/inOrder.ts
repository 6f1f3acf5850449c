import type { DirtyRun } from "../depend/propagate.js";
import type { Reference } from "../formula/reference.js";
import { resolveBound } from "../formula/reference.js";
import { referencesOf } from "./references.js";
import type { Session } from "./session.js";

/** An order of rows, and of the runs within a row, in which everything read is calculated before. */
export interface RowOrder {
  readonly downwards: boolean;
  readonly runs: readonly DirtyRun[];
}

/** How far, in rows, a run reads ahead of and behind itself in another run of its circle. */
interface Reach {
  readonly reader: DirtyRun;
  readonly read: DirtyRun;
  readonly least: number;
  readonly most: number;
}

/**
 * Runs that read each other can often be calculated row by row: each value from rows above (a running sum) or below.
 * Undefined where they cannot, or where that cannot be told without looking at every cell.
 */
export function rowOrder(session: Session, circle: readonly DirtyRun[]): RowOrder | undefined {
  const spilled = circle.some(({ sheet, column }) => session.peek(sheet, column).spills.length > 0);
  if (spilled || new Set(circle.map(({ sheet }) => sheet)).size > 1) {
    return undefined;
  }
  const reaches = circle.flatMap((reader) => circle.flatMap((read) => reachesOf(session, reader, read)));
  for (const downwards of [true, false]) {
    if (reaches.every(({ least, most }) => (downwards ? most <= 0 : least >= 0))) {
      const level = reaches.filter(({ least, most }) => (downwards ? most : least) === 0);
      const runs = withinRow(circle, level);
      if (runs !== undefined) {
        return { downwards, runs };
      }
    }
  }
  return undefined;
}

function reachesOf(session: Session, reader: DirtyRun, read: DirtyRun): Reach[] {
  const { world } = session;
  return referencesOf(world, reader.run.formula).flatMap((reference) => {
    const sheet = reference.sheet === undefined ? reader.sheet : world.sheetIndex(reference.sheet);
    return sheet === read.sheet && coversColumn(reference, reader.column, read.column)
      ? (reach(reference, reader, read) ?? [])
      : [];
  });
}

export function coversColumn(reference: Reference, home: number, column: number): boolean {
  const left = resolveBound(reference.left, home);
  const right = resolveBound(reference.right, home);
  return Math.min(left, right) <= column && column <= Math.max(left, right);
}

function reach(reference: Reference, reader: DirtyRun, read: DirtyRun): Reach | undefined {
  const { from, to } = reader.run;
  const last = to - 1;
  const lastRead = read.run.to - 1;
  const edges = (row: number): [number, number] => {
    const a = resolveBound(reference.top, row);
    const b = resolveBound(reference.bottom, row);
    return [Math.min(a, b), Math.max(a, b)];
  };
  const [lowFirst, highFirst] = edges(from);
  const [lowLast, highLast] = edges(last);
  if (Math.min(lowFirst, lowLast) > lastRead || Math.max(highFirst, highLast) < read.run.from) {
    return undefined;
  }
  // Both differences are largest or smallest at the ends: edges move by one row a row or stand still.
  const most = Math.max(Math.min(highFirst, lastRead) - from, Math.min(highLast, lastRead) - last);
  const least = Math.min(Math.max(lowFirst, read.run.from) - from, Math.max(lowLast, read.run.from) - last);
  return { reader, read, least, most };
}

/** The runs so that what is read in the same row comes first; undefined where that goes in a circle. */
function withinRow(circle: readonly DirtyRun[], level: readonly Reach[]): DirtyRun[] | undefined {
  const waiting = new Map<DirtyRun, Set<DirtyRun>>(circle.map((run) => [run, new Set()]));
  for (const { reader, read } of level) {
    waiting.get(reader)?.add(read);
  }
  const order: DirtyRun[] = [];
  while (waiting.size > 0) {
    const ready = [...waiting].filter(([, reads]) => reads.size === 0).map(([run]) => run);
    if (ready.length === 0) {
      return undefined;
    }
    for (const run of ready) {
      order.push(run);
      waiting.delete(run);
    }
    for (const reads of waiting.values()) {
      for (const run of ready) {
        reads.delete(run);
      }
    }
  }
  return order;
}
