import { type Column, cellAt } from "../call/column.js";
import { foldName } from "../table/foldName.js";
import { nameOf } from "../table/rowNames.js";

/** One object under two names: in the table, and in its revision. */
export interface Alias {
  readonly old: string;
  readonly new: string;
}

/** Rows that share a key. */
export interface RepeatedKey {
  readonly key: string;
  readonly rows: readonly number[];
}

/** Which row of the revision belongs to each row of the table. */
export interface KeyMatch {
  /** For each row of the table the row of the revision, -1 where there is none. */
  readonly rows: Int32Array;
  readonly exact: number;
  /** Found after blanks and capitals were left aside. */
  readonly folded: number;
  readonly aliased: number;
  /** Keys of the table that several rows have: all of them take the revision. */
  readonly repeated: readonly RepeatedKey[];
  /** Keys of the revision that rows with different values share: none of them is taken. */
  readonly ambiguous: readonly RepeatedKey[];
  /** Rows without a partner. */
  readonly onlyInTable: readonly number[];
  readonly onlyInRevision: readonly number[];
  /** Aliases that no row of the table or none of the revision has. */
  readonly unused: readonly Alias[];
}

/** `sameRows`: whether two rows of the revision say the same. */
export function matchKeys(
  table: Column,
  revision: Column,
  aliases: readonly Alias[],
  sameRows: (first: number, second: number) => boolean,
): KeyMatch {
  const { index: exactly, repeated } = indexOf(revision, (key) => key);
  // Most catalogues write their names the same way, and then the second index is never made.
  let folded: Index | undefined;
  const loosely = (key: string) => {
    folded ??= indexOf(revision, foldName).index;
    return folded.get(key);
  };
  const isTwofold = (rows: readonly number[]) => rows.some((row) => !sameRows(rows[0]!, row));
  const renamed = new Map(aliases.map((alias) => [foldName(alias.old), alias]));
  const rows = new Int32Array(table.length).fill(-1);
  const taken = new Uint8Array(revision.length);
  const used = new Set<Alias>();
  const doubtful = new Map<string, readonly number[]>();
  const onlyInTable: number[] = [];
  const counts = { exact: 0, folded: 0, aliased: 0 };

  /** Whether a key found its row, or several that disagree. */
  const take = (row: number, found: Found | undefined, how: keyof typeof counts): boolean => {
    if (found === undefined) return false;
    const all = typeof found === "number" ? [found] : found;
    for (const each of all) taken[each] = 1;
    if (all.length > 1 && isTwofold(all)) doubtful.set(nameOf(cellAt(revision, all[0]!)), all);
    else {
      rows[row] = all[0]!;
      counts[how]++;
    }
    return true;
  };
  for (let row = 0; row < table.length; row++) {
    const key = nameOf(cellAt(table, row));
    if (key !== "" && take(row, exactly.get(key), "exact")) continue;
    const alias = aliases.length > 0 ? renamed.get(foldName(key)) : undefined;
    if (key !== "" && take(row, loosely(foldName(key)), "folded")) continue;
    if (alias && take(row, exactly.get(alias.new) ?? loosely(foldName(alias.new)), "aliased")) used.add(alias);
    else onlyInTable.push(row);
  }
  const isLeft = (row: number) => taken[row] === 0;
  for (const { key, rows: all } of repeated) if (all.every(isLeft) && isTwofold(all)) doubtful.set(key, all);
  return {
    rows,
    ...counts,
    repeated: repeatedRows(table, rows, revision.length),
    ambiguous: [...doubtful].map(([key, all]) => ({ key, rows: all })),
    onlyInTable,
    onlyInRevision: rowsWhere(revision.length, isLeft),
    unused: aliases.filter((alias) => !used.has(alias)),
  };
}

/** Rows of the table that took the same row of the revision. */
function repeatedRows(table: Column, rows: Int32Array, size: number): RepeatedKey[] {
  const first = new Int32Array(size).fill(-1);
  const repeated = new Map<number, number[]>();
  for (let row = 0; row < rows.length; row++) {
    const source = rows[row]!;
    if (source < 0) continue;
    if (first[source]! < 0) first[source] = row;
    else repeated.set(source, [...(repeated.get(source) ?? [first[source]!]), row]);
  }
  return [...repeated.values()].map((all) => ({ key: nameOf(cellAt(table, all[0]!)), rows: all }));
}

function rowsWhere(length: number, isMeant: (row: number) => boolean): number[] {
  const rows: number[] = [];
  for (let row = 0; row < length; row++) if (isMeant(row)) rows.push(row);
  return rows;
}

/** A row, or the rows that share a key. */
type Found = number | number[];

type Index = ReadonlyMap<string, Found>;

/** Rows by their key; a key that one row has, as nearly all do, stands for its number alone. Blank keys name nothing. */
function indexOf(keys: Column, fold: (key: string) => string) {
  const index = new Map<string, Found>();
  const repeated = new Map<string, number[]>();
  for (let row = 0; row < keys.length; row++) {
    const key = fold(nameOf(cellAt(keys, row)));
    if (key === "") continue;
    const known = index.get(key);
    if (known === undefined) index.set(key, row);
    else if (typeof known === "number") {
      const rows = [known, row];
      index.set(key, rows);
      repeated.set(key, rows);
    } else known.push(row);
  }
  return { index, repeated: [...repeated].map(([key, rows]): RepeatedKey => ({ key, rows })) };
}
