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
  const { index: loosely } = indexOf(revision, foldName);
  const isTwofold = (rows: readonly number[]) => rows.some((row) => !sameRows(rows[0]!, row));
  const renamed = new Map(aliases.map((alias) => [foldName(alias.old), alias]));
  const rows = new Int32Array(table.length).fill(-1);
  const taken = new Set<number>();
  const used = new Set<Alias>();
  const doubtful = new Map<string, readonly number[]>();
  const onlyInTable: number[] = [];
  const counts = { exact: 0, folded: 0, aliased: 0 };

  /** Whether a key found its row, or several that disagree. */
  const take = (row: number, found: number | readonly number[] | undefined, how: keyof typeof counts): boolean => {
    if (found === undefined) return false;
    const all = typeof found === "number" ? [found] : found;
    for (const each of all) taken.add(each);
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
    const folded = foldName(key);
    if (key !== "" && take(row, loosely.get(folded), "folded")) continue;
    const alias = renamed.get(folded);
    if (alias && take(row, exactly.get(alias.new) ?? loosely.get(foldName(alias.new)), "aliased")) used.add(alias);
    else onlyInTable.push(row);
  }
  const isLeft = (row: number) => !taken.has(row);
  for (const { key, rows: all } of repeated) if (all.every(isLeft) && isTwofold(all)) doubtful.set(key, all);
  return {
    rows,
    ...counts,
    repeated: indexOf(table, (key) => key).repeated,
    ambiguous: [...doubtful].map(([key, all]) => ({ key, rows: all })),
    onlyInTable,
    onlyInRevision: Array.from({ length: revision.length }, (_, row) => row).filter(isLeft),
    unused: aliases.filter((alias) => !used.has(alias)),
  };
}

/** Rows by their key; a key that one row has, as nearly all do, stands for its number alone. Blank keys name nothing. */
function indexOf(keys: Column, fold: (key: string) => string) {
  const index = new Map<string, number | number[]>();
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
