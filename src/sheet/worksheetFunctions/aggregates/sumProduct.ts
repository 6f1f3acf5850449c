import { CellError } from "../../../call/cell.js";
import type { Matrix } from "../../values/operand.js";
import { define } from "../define/define.js";
import { matrix, rest } from "../define/parameters.js";
import { sumOf } from "../numerics/sum.js";

/** Section 6.16.64: the sum over all places of the products of the cells there; what is no number counts as 0. */
export const sumProduct = define("SUMPRODUCT", [rest(matrix("range"))] as const, (ranges) => {
  const [first] = ranges as readonly [Matrix];
  const { rows, columns } = first;
  if (ranges.some((range) => range.rows !== rows || range.columns !== columns)) {
    return new CellError(
      "#VALUE!",
      "SUMPRODUCT: ranges of unequal size",
      `SUMPRODUCT: the first range has ${rows} rows and ${columns} columns, another differs; ranges of the same size are needed`,
    );
  }
  const error = ranges.map(firstError).find((each) => each !== undefined);
  if (error) {
    return error;
  }
  const readers = ranges.map(numberReader);
  return sumOf(rows * columns, (place) => {
    let product = 1;
    for (const read of readers) {
      product *= read(Math.floor(place / columns), place % columns);
    }
    return product;
  });
});

function numberReader(range: Matrix): (row: number, column: number) => number {
  const only = range.block?.columns.length === 1 ? range.block.columns[0] : undefined;
  if (only && only.others === undefined) {
    return (row) => only.numbers[row] as number;
  }
  return (row, column) => {
    const cell = range.at(row, column);
    return typeof cell === "number" ? cell : 0;
  };
}

function firstError(range: Matrix): CellError | undefined {
  for (let column = 0; column < range.columns; column++) {
    if (range.block?.columns[column]?.others !== undefined || !range.block) {
      for (let row = 0; row < range.rows; row++) {
        const cell = range.at(row, column);
        if (cell instanceof CellError) {
          return cell;
        }
      }
    }
  }
  return undefined;
}
