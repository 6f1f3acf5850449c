import fc from "fast-check";
import { type Cell, CellError } from "../../src/call/cell.js";

/** Comparable whatever it is: errors by what they say, -0 apart from 0. */
export function bits(cell: Cell | undefined): string {
  if (cell instanceof CellError) return `${cell.code} ${cell.message}`;
  if (cell === undefined || cell === null) return "blank";
  return Object.is(cell, -0) ? "-0" : `${typeof cell} ${String(cell)}`;
}

/** Rows of equal width: what a narrower row lacks is blank. */
export function widened(rows: readonly (readonly Cell[])[]): string[][] {
  const width = Math.max(...rows.map((row) => row.length));
  return rows.map((row) => Array.from({ length: width }, (_, index) => bits(row[index])));
}

/** What stands in a column of a target table: mostly good numbers. */
export function cellLike(good: fc.Arbitrary<Cell>): fc.Arbitrary<Cell> {
  const bad = fc.constantFrom<Cell>(
    null,
    "",
    "n/a",
    0,
    -1,
    1e300,
    true,
    "5 mag",
    "1 Mjupp",
    new CellError("#REF!", "elsewhere", "gone"),
    new CellError("#N/A", "elsewhere", "not yet"),
  );
  return fc.oneof({ weight: 8, arbitrary: good }, { weight: 1, arbitrary: bad });
}

export function logarithmic(least: number, most: number): fc.Arbitrary<number> {
  return fc
    .double({ min: Math.log(least), max: Math.log(most), noNaN: true })
    .map((exponent) => Math.min(most, Math.max(least, Math.exp(exponent))));
}
