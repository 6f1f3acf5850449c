import { type Cell, CellError } from "../call/cell.js";
import { type Column, cellAt, type OtherCell } from "../call/column.js";
import { isWithin, openRange } from "../call/range.js";
import type { Span } from "../sheet/book/spans.js";
import { convertColumn, convertSigmas } from "../table/convertColumn.js";
import { isPlainNumberKind } from "../units/kind.js";
import { isProblem } from "../units/problem.js";
import { readQuantity } from "../units/readQuantity.js";
import { one, toBase, type Unit } from "../units/unit.js";
import { type BookColumn, type BookTable, isComputed, tableCells } from "./bookTable.js";
import type { PairedColumn, RevisionTable } from "./pairRevision.js";
import type { CountedFinding } from "./revisionFinding.js";

/** Cells of the sheet's column as the revision has them. */
export interface NewCells {
  readonly column: BookColumn;
  /** Of all rows of the table: what was not revised is what stands there. */
  readonly before: Column;
  readonly values: Column;
  readonly changed: number;
  /** Rows of the table that are written anew; few unchanged rows may lie between changed ones. */
  readonly spans: readonly Span[];
  readonly counts: ReadonlyMap<CountedFinding, CellsFound>;
  /** For each row of the table the row of the revision whose cell was taken, -1 where none was. */
  readonly taken: Int32Array;
  /** Whether the revision has a number for a row of the table. */
  isGiven(row: number): boolean;
}

export interface CellsFound {
  count: number;
  readonly row: number;
  readonly text: string;
}

/** Texts that catalogues write for no value (common practice). */
const noValue = /^(?:[-+]?nan|n\/?a|null|none|nil|masked|-{1,4}|\.{2,4}|\u2026|\u2013|\u2014|[-+]?inf(?:inity)?)$/i;

/** Few unchanged rows between changed ones are written too: one long stretch is cheaper than many short ones. */
const widestGap = 64;

/** A column of values, with the rows of the revision that belong to the table's. */
export function reviseValues(
  table: BookTable,
  { column, from, units }: PairedColumn,
  revision: RevisionTable,
  rows: Int32Array,
  erases: boolean,
): NewCells {
  const given = converted(revision.columns[from.index]!, units);
  return newCells(table, column, given, rows, { erases, accepts: acceptsValue(column, units?.to) });
}

/** Uncertainties of a column of values, in rows whose values were taken; `which` is their place beside it. */
export function reviseSigmas(
  table: BookTable,
  pair: PairedColumn,
  which: number,
  revision: RevisionTable,
  rows: Int32Array,
  erases: boolean,
): NewCells {
  const place = table.columns.find(({ column }) => column === pair.column.sigmas[which])!;
  const values = revision.columns[pair.from.index]!;
  const converts = pair.sigmas.map(({ index, recognised }) =>
    convertedSigmas(revision.columns[index]!, values, pair, recognised.unit, place.recognised.unit),
  );
  const isJoined = pair.column.sigmas.length === 1 && converts.length === 2;
  const given = isJoined ? largerOf(converts[0]!, converts[1]!) : converts[Math.min(which, converts.length - 1)]!;
  return newCells(table, place, given, rows, { erases, accepts: acceptsNumber });
}

interface Rules {
  readonly erases: boolean;
  /** Undefined where a cell may be taken. */
  accepts(cell: OtherCell | number, before: Cell): CountedFinding | undefined;
}

function newCells(table: BookTable, column: BookColumn, given: Column, rows: Int32Array, rules: Rules): NewCells {
  const before = tableCells(table, column.column);
  const numbers = before.numbers.slice();
  let others = before.others?.slice();
  const counts = new Map<CountedFinding, CellsFound>();
  const count = (about: CountedFinding, row: number, cell: Cell) => {
    const known = counts.get(about);
    if (known) known.count++;
    else counts.set(about, { count: 1, row, text: cell instanceof CellError ? cell.code : String(cell ?? "") });
  };
  const holdsFormulas = hasFormulas(table, column);
  const changedRows: number[] = [];
  const barred: number[] = [];
  const taken = rows.slice();
  for (let row = 0; row < table.rows; row++) {
    if (holdsFormulas && isComputed(table, column.column, row)) {
      barred.push(row);
      taken[row] = -1;
      if (rows[row]! >= 0) count("formula kept", row, null);
      continue;
    }
    const source = rows[row]!;
    if (source < 0) continue;
    let cell = cellAt(given, source);
    if (typeof cell === "string" && noValue.test(cell.trim())) {
      count("no value text", row, cell.trim());
      cell = null;
    }
    if (cell === "" || cell === null) {
      const was = cellAt(before, row);
      if (!rules.erases) taken[row] = -1;
      if (was === null || was === "") continue;
      count(rules.erases ? "blank erased" : "blank kept", row, null);
      if (!rules.erases) continue;
      cell = null;
    } else {
      const refused = rules.accepts(cell, cellAt(before, row));
      if (refused) {
        count(refused, row, cell);
        taken[row] = -1;
        continue;
      }
    }
    if (Object.is(cell, cellAt(before, row))) continue;
    changedRows.push(row);
    if (typeof cell === "number") {
      numbers[row] = cell;
      if (others) others[row] = undefined;
    } else {
      numbers[row] = Number.NaN;
      others ??= new Array(table.rows).fill(undefined);
      others[row] = cell;
    }
  }
  const isAllNumbers = others?.every((other) => other === undefined);
  const values = { length: table.rows, numbers, others: isAllNumbers ? undefined : others };
  const isGiven = (row: number) => rows[row]! >= 0 && typeof cellAt(given, rows[row]!) === "number";
  return {
    column,
    before,
    values,
    changed: changedRows.length,
    spans: spansOver(changedRows, barred),
    counts,
    taken,
    isGiven,
  };
}

/** Rows that are written: changed ones with the small gaps between them, where no barred row lies. */
function spansOver(rows: readonly number[], barred: readonly number[]): Span[] {
  const spans: { from: number; to: number }[] = [];
  let next = 0;
  for (const row of rows) {
    const last = spans.at(-1);
    while (next < barred.length && barred[next]! < (last?.to ?? 0)) next++;
    const isBarred = next < barred.length && barred[next]! < row;
    if (last && row - last.to <= widestGap && !isBarred) last.to = row + 1;
    else spans.push({ from: row, to: row + 1 });
  }
  return spans;
}

function hasFormulas({ book, sheet, firstRow }: BookTable, { column }: BookColumn): boolean {
  const state = book.sheets[sheet]?.columns[column];
  return [...(state?.runs ?? []), ...(state?.claims ?? [])].some(({ to }) => to > firstRow);
}

function converted(column: Column, units: PairedColumn["units"]): Column {
  return units && units.from.text !== units.to.text ? convertColumn(column, units.from, units.to) : column;
}

/** Uncertainties in the unit that their own header states, or else in that of their values; signs do not count. */
function convertedSigmas(
  sigmas: Column,
  values: Column,
  { units }: PairedColumn,
  own: Unit | undefined,
  place: Unit | undefined,
): Column {
  const [from, to] = [units?.from ?? one, place ?? units?.to ?? one];
  const inValuesUnit = own && own.kind === from.kind && own.text !== from.text ? convertSigmas(sigmas, values, own, from) : sigmas; // biome-ignore format: one choice
  return from.text === to.text ? inValuesUnit : convertSigmas(inValuesUnit, values, from, to);
}

function largerOf(upper: Column, lower: Column): Column {
  const numbers = upper.numbers.map((value, row) => Math.max(Math.abs(value), Math.abs(lower.numbers[row]!)));
  const others = upper.others?.map((cell, row) => cell ?? lower.others?.[row]) ?? lower.others;
  return { length: upper.length, numbers, others };
}

function acceptsNumber(cell: OtherCell | number): CountedFinding | undefined {
  return typeof cell === "number" ? undefined : "strange text";
}

/** Texts stand in columns of texts, and as quantities of the right kind; numbers within the quantity's bounds. */
function acceptsValue({ recognised }: BookColumn, unit: Unit | undefined): Rules["accepts"] {
  const { quantity } = recognised;
  const own = unit ?? (quantity && isPlainNumberKind(quantity.kind) ? one : undefined);
  const range = quantity && own?.kind === quantity.kind ? openRange(quantity) : undefined;
  const isNumeric = unit !== undefined || quantity !== undefined;
  return (cell, before) => {
    if (typeof cell === "number") return range && !isWithin(range, toBase(own!, cell)) ? "outside" : undefined;
    if (typeof cell !== "string") return isNumeric || cell instanceof CellError ? "strange text" : undefined;
    const reading = readQuantity(cell);
    if (!isProblem(reading)) {
      const stated = reading.unit ?? own;
      return own && stated && stated.kind !== own.kind ? "strange text" : undefined;
    }
    return isNumeric || typeof before === "number" ? "strange text" : undefined;
  };
}
