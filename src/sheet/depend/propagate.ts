import type { Book, ColumnSpan, Run, Spill } from "../book/book.js";
import { columnAt } from "../book/book.js";
import type { Span } from "../book/spans.js";
import { addRows, rowsOutside, spansIn } from "../book/spans.js";
import type { FindReaders, PlacedRun } from "./readers.js";

/** What an edit leaves to do. */
export interface Dirty {
  /** Cells whose value is another: their readers are to be calculated, unless that happened since. */
  readonly changed: readonly (ColumnSpan & { readonly group?: number })[];
  /** Formula cells to be calculated themselves. */
  readonly stale: readonly ColumnSpan[];
}

/** A run with rows to calculate, and the runs that read them. */
export interface DirtyRun extends PlacedRun {
  rows: readonly Span[];
  readonly readers: Set<DirtyRun>;
  visits: number;
}

/** A run that is dirty in more pieces is taken whole: it reads itself over other runs, or most of it is dirty anyway. */
const mostPieces = 1000;

/** Whether rows of a run were calculated after a group of others. */
export type IsFresh = (run: Run, rows: Span, group: number) => boolean;

/** From what changed to every row of every run that has to be calculated. */
export function propagate(book: Book, findReaders: FindReaders, dirty: Dirty, isFresh: IsFresh): DirtyRun[] {
  const runs = new Map<Run, DirtyRun>();
  const queue: { readonly run: DirtyRun; readonly rows: Span }[] = [];
  const blocked = blockedSpills(book);

  const runOf = ({ sheet, column, run }: PlacedRun): DirtyRun => {
    let known = runs.get(run);
    if (known === undefined) {
      known = { sheet, column, run, rows: [], readers: new Set(), visits: 0 };
      runs.set(run, known);
    }
    return known;
  };
  const soil = (run: DirtyRun, rows: Span): void => {
    if (run.visits > mostPieces || run.rows.length > mostPieces) {
      rows = run.run;
    }
    for (const piece of rowsOutside(run.rows, rows.from, rows.to)) {
      run.rows = addRows(run.rows, piece.from, piece.to);
      queue.push({ run, rows: piece });
    }
  };
  const pass = (sheet: number, column: number, rows: Span, source: DirtyRun | undefined, group?: number): void => {
    findReaders(sheet, column, rows, (placed, reading) => {
      if (group !== undefined && isFresh(placed.run, reading, group)) {
        return;
      }
      const reader = runOf(placed);
      source?.readers.add(reader);
      soil(reader, reader === source ? furtherRows(reader.run, reading, rows) : reading);
    });
    for (const { spill, ...at } of blocked) {
      if (at.sheet === sheet && column >= at.column && column < at.column + spill.width) {
        const from = Math.max(spill.from, rows.from - spill.rows + 1);
        for (const run of spansIn(columnAt(book, sheet, at.column).runs, from, Math.min(spill.to, rows.to))) {
          const owners = { from: Math.max(from, run.from), to: Math.min(spill.to, rows.to, run.to) };
          soil(runOf({ sheet, column: at.column, run }), owners);
        }
      }
    }
  };

  for (const { sheet, column, from, to } of dirty.stale) {
    for (const run of spansIn(columnAt(book, sheet, column).runs, from, to)) {
      soil(runOf({ sheet, column, run }), { from: Math.max(from, run.from), to: Math.min(to, run.to) });
    }
  }
  for (const { sheet, column, from, to, group } of dirty.changed) {
    pass(sheet, column, { from, to }, undefined, group);
  }
  for (let next = queue.pop(); next !== undefined; next = queue.pop()) {
    const { run, rows } = next;
    const { sheet, column } = run;
    run.visits++;
    pass(sheet, column, rows, run);
    for (const spill of spansIn(columnAt(book, sheet, column).spills, rows.from, rows.to)) {
      const filled = { from: Math.max(rows.from, spill.from), to: Math.min(rows.to, spill.to) + spill.rows - 1 };
      for (let across = spill.rows > 1 ? 0 : 1; across < spill.width && !spill.blocked; across++) {
        pass(sheet, column + across, filled, run);
      }
    }
  }
  return [...runs.values()];
}

/** A run that reads its own earlier rows hands a change on to its end, in one step. */
function furtherRows(run: Span, reading: Span, changed: Span): Span {
  if (reading.from > changed.from) {
    return { from: reading.from, to: run.to };
  }
  return reading.to < changed.to ? { from: run.from, to: reading.to } : run;
}

function blockedSpills(book: Book): { readonly sheet: number; readonly column: number; readonly spill: Spill }[] {
  return book.sheets.flatMap(({ columns }, sheet) =>
    columns.flatMap(({ spills }, column) =>
      spills.filter(({ blocked }) => blocked).map((spill) => ({ sheet, column, spill })),
    ),
  );
}
