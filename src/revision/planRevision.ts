import { type Column, cellAt } from "../call/column.js";
import { type Change, changeOf } from "../table/changeOf.js";
import { isPlausible, otherUnits } from "../table/checkColumn.js";
import { columnKey } from "../table/columnKey.js";
import { nearest } from "../units/nearest.js";
import { one, toBase } from "../units/unit.js";
import { type BookColumn, type BookTable, namesOfRows, tableCells } from "./bookTable.js";
import { type Alias, type KeyMatch, matchKeys } from "./matchKeys.js";
import {
  type PairedColumn,
  pairRevision,
  type RevisionColumn,
  type RevisionTable,
  revisionColumns,
} from "./pairRevision.js";
import { type CellsFound, type NewCells, reviseSigmas, reviseValues } from "./reviseColumn.js";
import type { RevisionFinding } from "./revisionFinding.js";
import { RevisionRefused } from "./revisionRefused.js";
import { unitSlips } from "./unitSlips.js";
import { listed, quoted } from "./words.js";

export interface RevisionRequest {
  /** The header of the column that names the rows, in the table and in the revision. */
  readonly key: string;
  readonly aliases?: readonly Alias[];
  /** Whether blanks of the revision erase; else what stands there stays. */
  readonly erases?: boolean;
}

/** What a revision would do to a table. Nothing is done before its edits are given to the sheet. */
export interface RevisionPlan {
  readonly table: BookTable;
  /** The table's column that names the rows. */
  readonly key: BookColumn;
  readonly match: KeyMatch;
  readonly columns: readonly RevisedColumn[];
  readonly findings: readonly RevisionFinding[];
  readonly nameOfRow: (row: number) => string;
}

/** A column of values that the revision has, with its uncertainties. */
export interface RevisedColumn {
  readonly column: BookColumn;
  /** The header in the revision. */
  readonly from: string;
  readonly by: PairedColumn["by"];
  readonly values: NewCells;
  readonly sigmas: readonly NewCells[];
  readonly largest: { readonly bySigma: RowChange | undefined; readonly byPart: RowChange | undefined };
}

export interface RowChange extends Change {
  readonly row: number;
  readonly before: number;
  readonly after: number;
}

/** Throws RevisionRefused where the rows cannot be matched at all. */
export function planRevision(table: BookTable, revision: RevisionTable, request: RevisionRequest): RevisionPlan {
  const { aliases = [], erases = false } = request;
  const columns = revisionColumns(revision);
  const keys = {
    table: keyColumn(table.columns, request.key, "table"),
    revision: keyColumn(columns, request.key, "revision"),
  };
  const { pairs, findings } = pairRevision(table, columns, keys);
  const nameOfRow = namesOfRows(table, keys.table.column);
  const match = matchKeys(
    tableCells(table, keys.table.column),
    revision.columns[keys.revision.index]!,
    aliases,
    sameRows(revision, pairs),
  );
  if (match.exact + match.folded + match.aliased === 0 && match.ambiguous.length === 0) {
    throw new RevisionRefused(nothingMatched(table, revision, keys, nameOfRow));
  }
  const revised = pairs.map((pair) => reviseColumn(table, pair, revision, match.rows, erases));
  return {
    table,
    key: keys.table,
    match,
    columns: revised,
    findings: [
      ...keyFindings(match, revision, keys, nameOfRow),
      ...findings,
      ...revised.flatMap((column) => cellFindings(column, nameOfRow)),
    ],
    nameOfRow,
  };
}

function keyColumn<C extends BookColumn | RevisionColumn>(columns: readonly C[], key: string, which: string): C {
  const found =
    columns.find(({ header }) => header === key) ??
    columns.find(({ header, recognised }) =>
      [header, recognised.name].some((own) => columnKey(own) === columnKey(key)),
    );
  if (found) return found;
  const names = columns.map(({ recognised }) => recognised.name);
  const near = nearest(key, names);
  throw new RevisionRefused(
    `the ${which} has no column ${quoted(key)}; ${near ? `did you mean ${quoted(near)}?` : `it has ${listed(names)}.`}`,
  );
}

function nothingMatched(
  { rows }: BookTable,
  revision: RevisionTable,
  { revision: key }: { readonly revision: RevisionColumn },
  nameOfRow: (row: number) => string,
): string {
  if (rows === 0) return "the table has no rows.";
  if (revision.rows === 0) return "the revision has no rows.";
  const name = String(cellAt(revision.columns[key.index]!, 0) ?? "");
  return `no row of the revision is in the table; the first is ${quoted(name)} in the revision and ${quoted(nameOfRow(0))} in the table. Name the column that both share, or give aliases.`;
}

/** Whether two rows of the revision say the same in all that is taken from them. */
function sameRows(
  { columns }: RevisionTable,
  pairs: readonly PairedColumn[],
): (first: number, second: number) => boolean {
  const taken = pairs.flatMap(({ from, sigmas }) => [from, ...sigmas].map(({ index }) => columns[index]!));
  return (first, second) => taken.every((column) => Object.is(cellAt(column, first), cellAt(column, second)));
}

function reviseColumn(
  table: BookTable,
  pair: PairedColumn,
  revision: RevisionTable,
  rows: Int32Array,
  erases: boolean,
): RevisedColumn {
  const values = reviseValues(table, pair, revision, rows, erases);
  const sigmas =
    pair.sigmas.length === 0
      ? []
      : pair.column.sigmas.map((_, which) => reviseSigmas(table, pair, which, revision, values.taken, erases));
  const standing =
    sigmas[0]?.before ?? (pair.column.sigmas[0] === undefined ? undefined : tableCells(table, pair.column.sigmas[0]));
  const lost = lostSigmas(values, standing, sigmas[0]);
  const counts = new Map(values.counts);
  if (lost) counts.set("lost uncertainty", lost);
  if (pair.column.sigmas.length === 1 && pair.sigmas.length === 2) {
    counts.set("two uncertainties in one", { count: sigmas[0]!.changed, row: 0, text: "" });
  }
  return {
    column: pair.column,
    from: pair.from.header,
    by: pair.by,
    values: { ...values, counts },
    sigmas,
    largest: largestChanges(values, standing, sigmas[0]),
  };
}

/** Values that changed beside an uncertainty for which the revision has no new one. */
function lostSigmas({ before, values }: NewCells, standing: Column | undefined, revised: NewCells | undefined) {
  if (!standing) return undefined;
  let found: CellsFound | undefined;
  for (let row = 0; row < values.length; row++) {
    if (Object.is(values.numbers[row], before.numbers[row]) || Number.isNaN(values.numbers[row])) continue;
    if (Number.isNaN(standing.numbers[row]) || revised?.isGiven(row)) continue;
    if (found) found.count++;
    else found = { count: 1, row, text: "" };
  }
  return found;
}

function largestChanges(
  { before, values }: NewCells,
  standing: Column | undefined,
  revised: NewCells | undefined,
): RevisedColumn["largest"] {
  let bySigma: RowChange | undefined;
  let byPart: RowChange | undefined;
  for (let row = 0; row < values.length; row++) {
    const [old, now] = [before.numbers[row]!, values.numbers[row]!];
    if (old === now || Number.isNaN(old) || Number.isNaN(now)) continue;
    const sigma = Math.abs(standing?.numbers[row] || revised?.values.numbers[row] || 0);
    const ratio = Math.abs((now - old) / sigma);
    const part = Math.abs((now - old) / old);
    if (sigma > 0 && (!bySigma || ratio > Math.abs(bySigma.sigmas!))) {
      bySigma = { row, before: old, after: now, ...changeOf(old, now, sigma) };
    }
    if (old !== 0 && (!byPart || part > Math.abs(byPart.relative!))) {
      byPart = { row, before: old, after: now, ...changeOf(old, now, sigma > 0 ? sigma : undefined) };
    }
  }
  return { bySigma, byPart };
}

function keyFindings(
  match: KeyMatch,
  revision: RevisionTable,
  keys: { readonly revision: RevisionColumn },
  nameOfRow: (row: number) => string,
): RevisionFinding[] {
  const names = revision.columns[keys.revision.index]!;
  const { onlyInTable, onlyInRevision, repeated, ambiguous, unused } = match;
  const of = (rows: readonly number[]) => rows.map((row) => String(cellAt(names, row) ?? "(blank)"));
  const findings: RevisionFinding[] = [];
  if (onlyInTable.length > 0) findings.push({ about: "only in table", keys: onlyInTable.map(nameOfRow) });
  if (onlyInRevision.length > 0) findings.push({ about: "only in revision", keys: of(onlyInRevision) });
  if (repeated.length > 0) {
    const rows = repeated.reduce((sum, own) => sum + own.rows.length, 0);
    findings.push({ about: "repeated in table", keys: repeated.map(({ key }) => key), rows });
  }
  if (ambiguous.length > 0) findings.push({ about: "ambiguous in revision", keys: ambiguous.map(({ key }) => key) });
  return [...findings, ...unused.map((alias): RevisionFinding => ({ about: "alias unused", alias }))];
}

function cellFindings(
  { column, values, sigmas }: RevisedColumn,
  nameOfRow: (row: number) => string,
): RevisionFinding[] {
  const counted = [values, ...sigmas].flatMap((cells) =>
    [...cells.counts].map(([about, { count, row, text }]): RevisionFinding => {
      return { about, header: cells.column.header, count, key: nameOfRow(row), text };
    }),
  );
  const { unit = one, quantity } = column.recognised;
  const isUnitless = column.recognised.unit === undefined && quantity !== undefined && quantity.kind !== one.kind;
  const slips = isUnitless ? [] : unitSlips(unit, values.before, values.values);
  return [
    ...slips.map((slip): RevisionFinding => {
      const row = slip.rows[0]!;
      const moved = [values.before.numbers[row]!, values.values.numbers[row]!] as const;
      return { about: "unit slip", header: column.header, unit, slip, changed: values.changed, key: nameOfRow(row), values: moved }; // biome-ignore format: one value
    }),
    ...implausible(column, values, nameOfRow),
    ...counted,
  ];
}

/** Values in cells that held none, where no ratio tells of a slip in the unit: they would be usual in another. */
function implausible(
  { header, recognised: { quantity, unit } }: BookColumn,
  { before, values }: NewCells,
  nameOfRow: (row: number) => string,
): RevisionFinding[] {
  if (!quantity || !unit || quantity.kind !== unit.kind) return [];
  const others = otherUnits(quantity, unit);
  const found = new Map<string, { row: number; count: number }>();
  for (let row = 0; row < values.length; row++) {
    const value = values.numbers[row]!;
    if (!Number.isNaN(before.numbers[row]) || Number.isNaN(value) || isPlausible(quantity, toBase(unit, value)))
      continue;
    const better = others.find((other) => isPlausible(quantity, toBase(other, value)))?.text;
    if (better === undefined) continue;
    const known = found.get(better);
    if (known) known.count++;
    else found.set(better, { row, count: 1 });
  }
  return [...found].map(([better, { row, count }]) => {
    const value = values.numbers[row]!;
    return { about: "implausible", header, quantity, unit, better, count, key: nameOfRow(row), value };
  });
}
