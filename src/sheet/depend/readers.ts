import type { Book, Run } from "../book/book.js";
import type { Span } from "../book/spans.js";
import type { Reference } from "../formula/reference.js";
import { resolveBound } from "../formula/reference.js";
import { dirtyRows, rowsRead } from "./dirtyRows.js";

/** A run where it stands. */
export interface PlacedRun {
  readonly sheet: number;
  readonly column: number;
  readonly run: Run;
}

interface Entry {
  readonly run: Run;
  readonly reference: Reference;
  readonly reads: Span;
}

/** Entries in the order of the first row read, with the furthest row read so far: a search can stop early. */
interface EntryList {
  readonly entries: readonly Entry[];
  readonly furthest: readonly number[];
}

/** What the runs of one column read, by sheet name ("" is the own sheet) and column. */
interface ColumnReads {
  readonly column: number;
  readonly bySheet: ReadonlyMap<string, ReadonlyMap<number, EntryList>>;
  readonly wide: readonly (Entry & { readonly left: number; readonly right: number })[];
  readonly names: readonly { readonly name: string; readonly run: Run }[];
}

/** References over more columns than this are looked through one by one. */
const widestListed = 32;

const cache = new WeakMap<readonly Run[], ColumnReads>();

function readsOf(runs: readonly Run[], column: number): ColumnReads {
  const known = cache.get(runs);
  if (known !== undefined && known.column === column) {
    return known;
  }
  const lists = new Map<string, Map<number, Entry[]>>();
  const wide: (Entry & { left: number; right: number })[] = [];
  const names: { name: string; run: Run }[] = [];
  for (const run of runs) {
    for (const name of run.formula.names) {
      names.push({ name: name.toUpperCase(), run });
    }
    for (const reference of run.formula.references) {
      if (reference === undefined) {
        continue;
      }
      const a = resolveBound(reference.left, column);
      const b = resolveBound(reference.right, column);
      const entry = { run, reference, reads: rowsRead(reference, run) };
      if (Math.abs(a - b) >= widestListed) {
        wide.push({ ...entry, left: Math.min(a, b), right: Math.max(a, b) });
        continue;
      }
      const sheet = reference.sheet?.toUpperCase() ?? "";
      const byColumn = lists.get(sheet) ?? new Map<number, Entry[]>();
      lists.set(sheet, byColumn);
      for (let target = Math.min(a, b); target <= Math.max(a, b); target++) {
        const list = byColumn.get(target);
        if (list === undefined) {
          byColumn.set(target, [entry]);
        } else {
          list.push(entry);
        }
      }
    }
  }
  const bySheet = new Map(
    [...lists].map(([sheet, byColumn]) => [
      sheet,
      new Map([...byColumn].map(([target, list]) => [target, sorted(list)])),
    ]),
  );
  const reads = { column, bySheet, wide, names };
  cache.set(runs, reads);
  return reads;
}

function sorted(list: Entry[]): EntryList {
  const entries = list.sort((a, b) => a.reads.from - b.reads.from);
  let far = Number.NEGATIVE_INFINITY;
  const furthest = entries.map((entry) => {
    far = Math.max(far, entry.reads.to);
    return far;
  });
  return { entries, furthest };
}

/** Calls `visit` with every run, and the rows of it, that read rows `changed` of a column. */
export type FindReaders = (
  sheet: number,
  column: number,
  changed: Span,
  visit: (reader: PlacedRun, rows: Span) => void,
) => void;

interface Source {
  readonly sheet: number;
  readonly column: number;
  readonly list: EntryList;
}

/** Who reads what in a book. What the runs of a column read is worked out once as long as the runs stay. */
export function findReadersIn(book: Book): FindReaders {
  const sheetIndex = new Map(book.sheets.map((sheet, index) => [sheet.name.toUpperCase(), index]));
  const sources: Map<number, Source[]>[] = book.sheets.map(() => new Map());
  const wide: { sheet: number; column: number; target: number; entry: ColumnReads["wide"][number] }[] = [];
  const named: (PlacedRun & { readonly target: number; readonly reference: Reference })[] = [];
  const targetIndex = (name: string | undefined, own: number): number =>
    name === undefined || name === "" ? own : (sheetIndex.get(name.toUpperCase()) ?? -1);
  const nameReferences = new Map(
    book.names.map(({ name, formula }) => [
      name.toUpperCase(),
      formula.references.filter((each) => each !== undefined),
    ]),
  );

  for (const [sheet, { columns }] of book.sheets.entries()) {
    for (const [column, { runs }] of columns.entries()) {
      if (runs.length === 0) {
        continue;
      }
      const reads = readsOf(runs, column);
      for (const [name, byColumn] of reads.bySheet) {
        const target = sources[targetIndex(name, sheet)];
        for (const [at, list] of target === undefined ? [] : byColumn) {
          const known = target?.get(at);
          if (known === undefined) {
            target?.set(at, [{ sheet, column, list }]);
          } else {
            known.push({ sheet, column, list });
          }
        }
      }
      for (const entry of reads.wide) {
        wide.push({ sheet, column, target: targetIndex(entry.reference.sheet, sheet), entry });
      }
      for (const { name, run } of reads.names) {
        for (const reference of nameReferences.get(name) ?? []) {
          named.push({ sheet, column, run, target: targetIndex(reference.sheet, sheet), reference });
        }
      }
    }
  }

  return (sheet, column, changed, visit) => {
    for (const source of sources[sheet]?.get(column) ?? []) {
      visitList(source, changed, visit);
    }
    for (const { entry, target, ...at } of wide) {
      if (target === sheet && column >= entry.left && column <= entry.right) {
        visitRows({ ...at, run: entry.run }, entry.reference, changed, visit);
      }
    }
    for (const { target, reference, ...reader } of named) {
      if (target === sheet && column >= reference.left.at && column <= reference.right.at) {
        visitRows(reader, reference, changed, visit);
      }
    }
  };
}

function visitList(source: Source, changed: Span, visit: (reader: PlacedRun, rows: Span) => void): void {
  const { entries, furthest } = source.list;
  let low = 0;
  let high = entries.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((entries[middle] as Entry).reads.from < changed.to) {
      low = middle + 1;
    } else {
      high = middle;
    }
  }
  for (let index = low - 1; index >= 0 && (furthest[index] as number) > changed.from; index--) {
    const { run, reference, reads } = entries[index] as Entry;
    if (reads.to > changed.from) {
      visitRows({ sheet: source.sheet, column: source.column, run }, reference, changed, visit);
    }
  }
}

function visitRows(
  reader: PlacedRun,
  reference: Reference,
  changed: Span,
  visit: (reader: PlacedRun, rows: Span) => void,
): void {
  const rows = dirtyRows(reference, reader.run, changed);
  if (rows.from < rows.to) {
    visit(reader, rows);
  }
}
