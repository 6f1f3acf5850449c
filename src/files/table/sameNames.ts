import type { TableFinding } from "./tableFinding.js";

/** Headers that stand over more than one column. */
export function sameNames(header: readonly string[]): TableFinding[] {
  const places = new Map<string, number[]>();
  for (const [column, name] of header.entries()) {
    const known = places.get(name);
    if (known) known.push(column);
    else places.set(name, [column]);
  }
  return [...places]
    .filter(([name, columns]) => name !== "" && columns.length > 1)
    .map(([name, columns]) => ({ kind: "duplicate-header", header: name, columns }));
}
