import type { DirtyRun } from "../depend/propagate.js";
import { evaluateRows } from "../evaluate/evaluateRows.js";
import type { Scene } from "../evaluate/scene.js";
import type { Stretch } from "../evaluate/stretch.js";
import type { Session } from "./session.js";
import { writeRows } from "./writeRows.js";

/** Rows of a formula that are evaluated together: few at first, until it has shown how long it takes. */
const firstRows = 512;
const mostRows = 8192;

/** What a slice may take before the next one is made shorter [ms]. */
const longEnough = 30;

/** Calculates the dirty rows of a run that does not read itself; yields the number of rows done each time. */
export function* evaluateRun(session: Session, dirty: DirtyRun): Generator<number, void> {
  const { sheet, column, run } = dirty;
  const { world } = session;
  const scene: Scene = { world, formula: run.formula, sheet, column, known: new Map() };
  const running: Stretch["running"] = new Map();
  let together = firstRows;
  for (const span of dirty.rows) {
    for (let from = span.from; from < span.to; ) {
      // Whole chunks are written without copying, so a slice ends where its chunk does.
      const to = Math.min(span.to, from + together, session.column(sheet, column).cells.chunkEnd(from));
      const began = performance.now();
      const rows = evaluateRows(run.formula.tree, { ...scene, from, to, shared: new Map(), running });
      writeRows(session, dirty, from, to, rows);
      const took = performance.now() - began;
      yield to - from;
      together = nextRows(to - from, took);
      from = to;
    }
  }
}

/** Rows for the next slice, after some took so long: at most eight times as many, at least one. */
function nextRows(rows: number, took: number): number {
  const wanted = Math.ceil((rows * longEnough) / Math.max(took, longEnough / 8));
  return Math.max(1, Math.min(mostRows, wanted));
}
