import type { Book } from "../sheet/book/book.js";
import { byImportance, changeOf } from "../table/changeOf.js";
import { matchRows, type RowPair } from "../table/matchRows.js";
import { type ColumnPair, pairColumns } from "../table/pairColumns.js";
import { type BookColumn, type BookTable, bookTable, namesOfRows } from "./bookTable.js";
import { changedInputs } from "./changedInputs.js";
import { type Condition, readCondition } from "./condition.js";
import { eachChange, eachPair, type TwoStates } from "./eachChange.js";
import { inputPaths } from "./inputPaths.js";
import type { Crossing, Ledger, LedgerChange, LedgerColumn, RevisionSource, WatchedCondition } from "./ledger.js";
import { RevisionRefused } from "./revisionRefused.js";

/**
 * Compares the table of a sheet in two states of its book. `conditions` are texts such as `K >= 1 m/s`; `key` is the
 * header of the column that names the rows, where it is not the first of texts. Throws RevisionRefused where a state has
 * no table there or a condition cannot be read.
 */
export function ledgerOf(
  before: Book,
  after: Book,
  sheet: number,
  conditions: readonly string[],
  source: RevisionSource,
  key?: string,
): Ledger {
  const [old, now] = [tableIn(before, sheet), tableIn(after, sheet)];
  const watched = conditions.map((text) => readCondition(text, old.columns));
  const pairs = pairColumns(old.columns, now.columns);
  const keys = pairs.find(({ from }) => from.header === key);
  const { rows, nameOfRow } = matchedRows(old, now, keys);
  const states = { before: old, after: now, rows };
  const unshared = whyUnshared(states, pairs);
  const inputs = unshared === undefined ? changedInputs(old, now) : [];
  const pathTo = inputPaths(after);
  const headers = new Map(now.columns.map(({ column, header }) => [column, header]));
  const waysTo = ({ column }: BookColumn) =>
    inputs.map(({ sheet: on, columns }) =>
      pathTo(
        columns.map((own) => ({ sheet: on, column: own })),
        { sheet, column },
      )?.map((place) => (place.sheet === sheet ? headers.get(place.column) : undefined) ?? "another sheet"),
    );
  const paired = new Set(pairs.flatMap(({ from, to }) => [from, to]));
  return {
    ...states,
    source,
    sheet: after.sheets[sheet]!.name,
    nameOfRow,
    columns: pairs.flatMap((pair) => {
      const role = roleOf(pair);
      return role === undefined ? [] : ledgerColumn(states, pair, role, role === "derived" ? waysTo(pair.to) : []);
    }),
    inputs,
    unshared,
    conditions: watched.map((condition) => watchedCondition(states, condition, pairs, nameOfRow)),
    onlyBefore: old.columns.filter((column) => !paired.has(column)).map(({ header }) => header),
    onlyAfter: now.columns.filter((column) => !paired.has(column)).map(({ header }) => header),
  };
}

function tableIn(book: Book, sheet: number): BookTable {
  const table = bookTable(book, sheet);
  if (table) return table;
  const name = book.sheets[sheet]?.name ?? sheet + 1;
  throw new RevisionRefused(`the sheet "${name}" holds no table; put a row of column names above its data.`);
}

/** What was typed, values and uncertainties; what formulas work out, without the uncertainties beside it. */
function roleOf({ from, to }: ColumnPair<BookColumn>): LedgerColumn["role"] | undefined {
  if (!from.isDerived && !to.isDerived) return "revised";
  return to.sigmaOf === undefined ? "derived" : undefined;
}

function ledgerColumn(
  states: TwoStates,
  pair: ColumnPair<BookColumn>,
  role: LedgerColumn["role"],
  ways: LedgerColumn["ways"],
): LedgerColumn[] {
  const counts = { changed: 0, ceased: 0, began: 0 };
  let largest: LedgerChange | undefined;
  eachChange(states, pair, (at, before, after, sigma) => {
    counts.changed++;
    if (typeof before === "number" && typeof after !== "number") counts.ceased++;
    if (typeof before !== "number" && typeof after === "number") counts.began++;
    const change = changeOf(before, after, sigma);
    if (!largest || byImportance(change, largest) < 0) largest = { at, before, after, ...change };
  });
  if (role === "revised" && counts.changed === 0) return [];
  return [{ header: pair.from.header, role, pair, ...counts, largest, ways }];
}

function matchedRows(old: BookTable, now: BookTable, keys: ColumnPair<BookColumn> | undefined) {
  const nameBefore = namesOfRows(old, keys?.from.column);
  const nameAfter = namesOfRows(now, keys?.to.column);
  if (old.rows === now.rows && sameNames(old.rows, nameBefore, nameAfter))
    return { rows: undefined, nameOfRow: nameBefore };
  const names = (table: BookTable, name: (row: number) => string) => Array.from({ length: table.rows }, (_, row) => name(row)); // biome-ignore format: one line
  const rows: readonly RowPair[] = matchRows(names(old, nameBefore), names(now, nameAfter));
  return { rows, nameOfRow: (at: number) => rows[at]!.key };
}

function sameNames(rows: number, before: (row: number) => string, after: (row: number) => string): boolean {
  for (let row = 0; row < rows; row++) if (before(row) !== after(row)) return false;
  return true;
}

/** To change one input at a time, both states must be the same but for what was typed. */
function whyUnshared({ before, after, rows }: TwoStates, pairs: readonly ColumnPair<BookColumn>[]): string | undefined {
  if (rows || before.firstRow !== after.firstRow) return "rows were added, taken away, renamed or put in another order";
  const isMoved = pairs.some(({ from, to }) => from.column !== to.column);
  const isSame = pairs.length === before.columns.length && pairs.length === after.columns.length;
  if (isMoved || !isSame || before.book.sheets.length !== after.book.sheets.length) {
    return "columns or sheets were added, taken away or moved";
  }
  return undefined;
}

function watchedCondition(
  states: TwoStates,
  condition: Condition,
  pairs: readonly ColumnPair<BookColumn>[],
  nameOfRow: (at: number) => string,
): WatchedCondition {
  const counts = { metBefore: 0, metAfter: 0 };
  const gained: Crossing[] = [];
  const lost: Crossing[] = [];
  const pair = pairs.find(({ from }) => from === states.before.columns[condition.index]);
  // Both states are compared in the unit that the column had before.
  const unit = pair?.from.recognised.unit;
  if (pair) {
    eachPair(states, pair, (at, before, after) => {
      const [was, is] = [condition.isMet(before, unit), condition.isMet(after, unit)];
      counts.metBefore += was ? 1 : 0;
      counts.metAfter += is ? 1 : 0;
      if (was === is) return;
      (is ? gained : lost).push({ key: nameOfRow(at), before, after });
    });
  }
  return { condition, ...counts, gained, lost };
}
