import { eachPair } from "../../../../revision/eachChange.js";
import type { Ledger } from "../../../../revision/ledger.js";
import { pairColumns } from "../../../../table/pairColumns.js";
import { readHeader } from "../../../../units/readHeader.js";
import type { MovedColumn, RevisionMoves } from "../../protocol/revise.js";

interface BothStates {
  readonly header: string;
  readonly before: Float64Array;
  readonly after: Float64Array;
}

/** Two columns before and after a revision, in the rows that moved in either. */
export function revisionMoves(ledger: Ledger, sheet: number, headers: readonly [string, string]): RevisionMoves {
  const { before, after, rows, source } = ledger;
  const pairs = pairColumns(before.columns, after.columns);
  const size = rows?.length ?? Math.max(before.rows, after.rows);
  const columns: BothStates[] = [];
  for (const header of headers) {
    const pair = pairs.find(({ from, to }) => from.header === header || to.header === header);
    if (!pair) return { is: "missing", message: `The revised table has no column "${header}"; choose another.` };
    const both = { header: pair.from.header, before: blank(size), after: blank(size) };
    eachPair(ledger, pair, (at, was, is) => {
      if (typeof was === "number") both.before[at] = was;
      if (typeof is === "number") both.after[at] = is;
    });
    columns.push(both);
  }
  const [x, y] = columns as [BothStates, BothStates];
  const moved: number[] = [];
  for (let at = 0; at < size; at++) if (isMoved(x, at) || isMoved(y, at)) moved.push(at);
  if (moved.length === 0) {
    return {
      is: "missing",
      message: `The revision moved no number of ${x.header} or ${y.header}; choose other columns.`,
    };
  }
  const rowOf = (at: number) => (rows ? (rows[at]?.to ?? -1) : at);
  return {
    is: "moves",
    file: source.file,
    date: source.date,
    sheet,
    rows: Int32Array.from(moved, (at) => after.firstRow + rowOf(at)),
    x: movedColumn(x, moved),
    y: movedColumn(y, moved),
  };
}

function blank(size: number): Float64Array {
  return new Float64Array(size).fill(Number.NaN);
}

function isMoved({ before, after }: BothStates, at: number): boolean {
  return !Object.is(before[at], after[at]);
}

function movedColumn({ header, before, after }: BothStates, moved: readonly number[]): MovedColumn {
  const { name, unit } = readHeader(header);
  return {
    name: name || header,
    unit: unit === undefined || unit.text === "1" ? "" : unit.text,
    before: Float64Array.from(moved, (at) => before[at]!),
    after: Float64Array.from(moved, (at) => after[at]!),
  };
}
