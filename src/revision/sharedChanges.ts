import { type Cell, CellError } from "../call/cell.js";
import { cellAt } from "../call/column.js";
import { type Area, type Book, columnAt } from "../sheet/book/book.js";
import { cellOf } from "../sheet/book/cellOf.js";
import { readColumn } from "../sheet/book/readColumn.js";
import { change } from "../sheet/change.js";
import type { Edit } from "../sheet/edit/draft.js";
import { pasteCells } from "../sheet/edit/pasteCells.js";
import { noFunctions } from "../sheet/formula/functions.js";
import { sameValue } from "../table/changeOf.js";
import { fromBase, toBase } from "../units/unit.js";
import { bookTable } from "./bookTable.js";
import type { ChangedInput } from "./changedInputs.js";
import type { Ledger, LedgerChange, LedgerColumn } from "./ledger.js";
import { isRowWise } from "./rowWise.js";

/** How a change is shared out among the inputs. */
export interface SharedChange {
  /** By the ledger's inputs; undefined where an input does not reach the cell, or the change is no number. */
  readonly parts: readonly (number | undefined)[];
  /** What the parts leave of the change; undefined where the change is no number or has no parts. */
  readonly remainder: number | undefined;
  /** The input that moved it most. */
  readonly movedBy: ChangedInput | undefined;
}

export type SharedCell = LedgerChange & { readonly column: LedgerColumn };

/** For so many rows only these are calculated again; for more, whole columns at once are faster. */
const fewRows = 2048;

/**
 * The part of an input is the mean of what it does alone to the state before, and of what is lost when it alone is taken
 * back from the state after: with one or two inputs the parts add up to the change but for rounding. Each such state is
 * calculated once, for all cells together. Gives what to ask for the share of one of the cells.
 */
export function sharedChanges(ledger: Ledger, cells: readonly SharedCell[]): (index: number) => SharedChange {
  const reaching = ledger.inputs.map((_, input) => cells.some(({ column }) => column.ways[input] !== undefined));
  const active = [...ledger.inputs.keys()].filter((input) => reaching[input]);
  const sums = ledger.inputs.map(() => new Float64Array(cells.length));
  const sole: (number | undefined)[] = new Array(cells.length).fill(undefined);
  const add = (input: number, state: Book, sign: 1 | -1, from: "before" | "after") => {
    const valueIn = reader(ledger, state);
    cells.forEach((cell, index) => {
      const value = valueIn(cell);
      const origin = cell[from];
      const isNumber = typeof value === "number" && typeof origin === "number";
      sums[input]![index]! += isNumber ? (sign * (value - origin)) / 2 : Number.NaN;
      if (from === "before" && cell.change === undefined && isAlike(value, cell.after)) sole[index] ??= input;
    });
  };
  if (active.length === 1) {
    const only = active[0]!;
    cells.forEach((cell, index) => {
      sums[only]![index] = cell.change ?? Number.NaN;
      sole[index] = only;
    });
  } else if (active.length > 1) {
    const swap = swapper(ledger, cells);
    for (const input of active) {
      const alone = swap(ledger.before.book, ledger.after.book, ledger.inputs[input]!);
      add(input, alone, 1, "before");
      // Of two inputs, the one alone is the other taken back.
      if (active.length === 2) add(active[0] === input ? active[1]! : active[0]!, alone, -1, "after");
      else add(input, swap(ledger.after.book, ledger.before.book, ledger.inputs[input]!), -1, "after");
    }
  }
  return (index) =>
    shared(
      ledger,
      cells[index]!,
      sums.map((sum) => sum[index]!),
      sole[index],
    );
}

/** Errors are alike by their code: their sentences quote what other inputs held. */
function isAlike(a: Cell, b: Cell): boolean {
  return a instanceof CellError && b instanceof CellError ? a.code === b.code : sameValue(a, b);
}

function shared(
  ledger: Ledger,
  { change, column }: SharedCell,
  sums: readonly number[],
  sole: number | undefined,
): SharedChange {
  const reaches = (input: number) => column.ways[input] !== undefined;
  if (change === undefined) {
    const moved = sole !== undefined && reaches(sole) ? ledger.inputs[sole] : undefined;
    return { parts: sums.map(() => undefined), remainder: undefined, movedBy: moved };
  }
  const parts = sums.map((sum, input) => (reaches(input) && !Number.isNaN(sum) ? sum : undefined));
  const known = parts.filter((part) => part !== undefined);
  if (known.length === 0) return { parts, remainder: undefined, movedBy: undefined };
  const size = (input: number) => Math.abs(parts[input] ?? -0);
  const most = [...parts.keys()]
    .filter((input) => parts[input] !== undefined)
    .reduce((a, b) => (size(b) > size(a) ? b : a));
  return { parts, remainder: change - known.reduce((sum, part) => sum + part, 0), movedBy: ledger.inputs[most] };
}

/** A book with one input as another book has it; where rows stand for themselves, in the rows of the cells only. */
function swapper({ before, after, columns: derived }: Ledger, cells: readonly SharedCell[]) {
  const rows = [...new Set(cells.map(({ at }) => at))].sort((a, b) => a - b);
  const isLimited = rows.length <= fewRows && isRowWise(before, derived) && isRowWise(after, derived);
  return (base: Book, donor: Book, { sheet, columns }: ChangedInput): Book => {
    const whole = Math.max(...columns.map((column) => longest(base, donor, sheet, column)), 1);
    const isHere = sheet === after.sheet && isLimited;
    const stretches = isHere
      ? [{ from: 0, to: after.firstRow }, ...neighbours(rows.map((row) => row + after.firstRow))]
      : [{ from: 0, to: whole }];
    const edits = columns.flatMap((column) =>
      stretches.flatMap(({ from, to }): Edit[] => {
        const area: Area = { sheet, left: column, right: column, top: from, bottom: to - 1 };
        // Headers that did not change would have the whole column calculated again.
        if (isHere && from === 0 && sameCells(base, donor, area)) return [];
        return [pasteCells({ book: donor, area }, { sheet, row: from, column })];
      }),
    );
    return change(base, edits, noFunctions);
  };
}

function longest(base: Book, donor: Book, sheet: number, column: number): number {
  return Math.max(columnAt(base, sheet, column).cells.length, columnAt(donor, sheet, column).cells.length);
}

function sameCells(base: Book, donor: Book, { sheet, left, top, bottom }: Area): boolean {
  const span = { sheet, column: left, from: top, to: bottom + 1 };
  const [own, other] = [readColumn(base, span), readColumn(donor, span)];
  for (let row = 0; row < own.length; row++) if (!sameValue(cellAt(own, row), cellAt(other, row))) return false;
  return true;
}

function neighbours(rows: readonly number[]) {
  const spans: { from: number; to: number }[] = [];
  for (const row of rows) {
    const last = spans.at(-1);
    if (last?.to === row) last.to++;
    else spans.push({ from: row, to: row + 1 });
  }
  return spans;
}

/** What cells hold in a state, in the unit that their columns had before. */
function reader({ before }: Ledger, state: Book): (cell: SharedCell) => Cell {
  const { sheet, firstRow } = before;
  let units: Map<number, ReturnType<typeof unitIn>> | undefined;
  const unitIn = (column: number) =>
    bookTable(state, sheet)?.columns.find((own) => own.column === column)?.recognised.unit;
  return ({ at, column: { pair } }) => {
    const cell = cellOf(state, { sheet, row: firstRow + at, column: pair.from.column });
    if (!pair.units || typeof cell !== "number") return cell;
    units ??= new Map();
    const unit = units.get(pair.from.column) ?? unitIn(pair.from.column);
    units.set(pair.from.column, unit);
    return unit ? fromBase(pair.units.from, toBase(unit, cell)) : cell;
  };
}
