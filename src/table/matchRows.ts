/** A row of two states of a table; undefined where the row is not there. */
export interface RowPair {
  readonly key: string;
  readonly from: number | undefined;
  readonly to: number | undefined;
}

/** Rows belong together by their names; rows that share a name are taken in order. */
export function matchRows(before: readonly string[], after: readonly string[]): RowPair[] {
  const waiting = new Map<string, number[]>();
  after.forEach((key, row) => {
    const rows = waiting.get(key);
    if (rows) rows.push(row);
    else waiting.set(key, [row]);
  });
  const matched: RowPair[] = before.map((key, from) => ({ key, from, to: waiting.get(key)?.shift() }));
  for (const [key, rows] of waiting) for (const to of rows) matched.push({ key, from: undefined, to });
  return matched;
}
