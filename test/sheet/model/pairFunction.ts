import type { Cell } from "../../../src/call/cell.js";
import type { CellFunction } from "../../../src/call/cellFunction.js";
import type { Block } from "../../../src/call/column.js";
import { cellAt, columnOf } from "../../../src/call/column.js";
import type { Functions } from "../../../src/sheet/formula/functions.js";

/** TEST.PAIR(x): above 3 the number and its half beside it, else what came, alone: a result with and without sigma. */
const pair: CellFunction = {
  name: "TEST.PAIR",
  leastArguments: 1,
  mostArguments: 2,
  once: ([input]) => {
    const column = input?.block.columns[0] ?? columnOf([null]);
    return widest(Array.from({ length: column.length }, (_, row) => results(cellAt(column, row))));
  },
  eachRow: (rows, [input]) =>
    widest(
      Array.from({ length: rows }, (_, row) => {
        if (input === undefined || "perRow" in input) {
          const column = input?.perRow[0];
          return results(column === undefined ? null : cellAt(column, row));
        }
        const fixed = input.fixed?.block.columns[0];
        return results(fixed === undefined ? null : cellAt(fixed, 0));
      }),
    ),
};

function results(cell: Cell): Cell[] {
  return typeof cell === "number" && cell > 3 ? [cell, cell / 2] : [cell ?? 0];
}

function widest(rows: readonly Cell[][]): Block {
  const width = Math.max(...rows.map((row) => row.length));
  const columns = Array.from({ length: width }, (_, index) => columnOf(rows.map((row) => row[index] ?? null)));
  return { rows: rows.length, columns };
}

export const pairFunctions: Functions = {
  cellFunction: (name) => (name === pair.name ? pair : undefined),
  cellFunctionNames: () => [pair.name],
};
