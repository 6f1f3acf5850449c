import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import type { Matrix } from "../../values/operand.js";
import { conditionOf } from "./criterion.js";

/** The places of a rectangle, row by row: 1 where every condition holds, 0 elsewhere. */
export interface Matching {
  readonly rows: number;
  readonly columns: number;
  readonly holds: Uint8Array;
}

/**
 * Where all of the pairs of range and criterion hold. Ranges of unequal size are an error. A criterion is one value.
 */
export function matchingOf(
  pairs: readonly (readonly [Matrix, { readonly cell: Cell }])[],
  name: string,
): Matching | CellError {
  const [first] = pairs[0] as readonly [Matrix, unknown];
  const { rows, columns } = first;
  const holds = new Uint8Array(rows * columns).fill(1);
  for (const [range, criterion] of pairs) {
    if (range.rows !== rows || range.columns !== columns) {
      return unequalRanges(name, range, rows, columns);
    }
    narrow(holds, range, criterion.cell);
  }
  return { rows, columns, holds };
}

function narrow(holds: Uint8Array, range: Matrix, criterion: Cell): void {
  const condition = conditionOf(criterion);
  const { rows, columns } = range;
  for (let column = 0; column < columns; column++) {
    const packed = range.block?.columns[column];
    for (let row = 0; row < rows; row++) {
      const place = row * columns + column;
      if (holds[place] === 1) {
        const cell =
          packed && packed.others?.[row] === undefined ? (packed.numbers[row] as number) : range.at(row, column);
        holds[place] = condition(cell) ? 1 : 0;
      }
    }
  }
}

/** The number cells of a rectangle at the places that match, its first cell laid on the first place. */
export function numbersWhere(matching: Matching, values: Matrix, name: string): Float64Array | CellError {
  const { rows, columns, holds } = matching;
  if (values.rows < rows || values.columns < columns) {
    return unequalRanges(name, values, rows, columns);
  }
  const kept = new Float64Array(holds.length);
  let count = 0;
  for (let place = 0; place < holds.length; place++) {
    if (holds[place] === 1) {
      const cell = values.at(Math.floor(place / columns), place % columns);
      if (cell instanceof CellError) {
        return cell;
      }
      if (typeof cell === "number") {
        kept[count++] = cell;
      }
    }
  }
  return kept.subarray(0, count);
}

function unequalRanges(name: string, range: Matrix, rows: number, columns: number): CellError {
  return new CellError(
    "#VALUE!",
    `${name}: ranges of unequal size`,
    `${name}: one range has ${range.rows} rows and ${range.columns} columns, another ${rows} rows and ${columns} columns; ranges of the same size are needed`,
  );
}
