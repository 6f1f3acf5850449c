import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import type { Matrix } from "../../values/operand.js";
import { conditionOf, equalValue } from "./criterion.js";
import { rowsByValue } from "./rowsByValue.js";

/** The places of a rectangle, counted row by row, where every condition holds. */
export interface Matching {
  readonly rows: number;
  readonly columns: number;
  readonly places: ArrayLike<number>;
}

/**
 * Where all of the pairs of range and criterion hold. Ranges of unequal size are an error. A criterion is one value.
 */
export function matchingOf(
  pairs: readonly (readonly [Matrix, { readonly cell: Cell }])[],
  name: string,
): Matching | CellError {
  const [first, criterion] = pairs[0] as readonly [Matrix, { readonly cell: Cell }];
  const { rows, columns } = first;
  const unequal = pairs.find(([range]) => range.rows !== rows || range.columns !== columns);
  if (unequal) {
    return unequalRanges(name, unequal[0], rows, columns);
  }
  let places = placesIn(first, criterion.cell);
  for (const [range, { cell }] of pairs.slice(1)) {
    places = narrowed(places, places.length, range, cell);
  }
  return { rows, columns, places };
}

/** Where one condition holds. A single value is looked up in a column that is searched again and again. */
function placesIn(range: Matrix, criterion: Cell): ArrayLike<number> {
  const { rows, columns } = range;
  const column = columns === 1 ? range.block?.columns[0] : undefined;
  const value = column && equalValue(criterion);
  const known = column && value !== undefined ? rowsByValue(column, value) : undefined;
  return known ?? narrowed(undefined, rows * columns, range, criterion);
}

/** Of some places, or of all, those where one more condition holds. */
function narrowed(
  places: ArrayLike<number> | undefined,
  count: number,
  range: Matrix,
  criterion: Cell,
): ArrayLike<number> {
  const condition = conditionOf(criterion);
  const { columns } = range;
  const kept = new Uint32Array(count);
  let found = 0;
  for (let index = 0; index < count; index++) {
    const place = places ? (places[index] as number) : index;
    const column = place % columns;
    const row = columns === 1 ? place : Math.floor(place / columns);
    const packed = range.block?.columns[column];
    const cell = packed && packed.others?.[row] === undefined ? (packed.numbers[row] as number) : range.at(row, column);
    if (condition(cell)) {
      kept[found++] = place;
    }
  }
  return kept.subarray(0, found);
}

/** The number cells of a rectangle at the places that match, its first cell laid on the first place. */
export function numbersWhere(matching: Matching, values: Matrix, name: string): Float64Array | CellError {
  const { rows, columns, places } = matching;
  if (values.rows < rows || values.columns < columns) {
    return unequalRanges(name, values, rows, columns);
  }
  const kept = new Float64Array(places.length);
  let count = 0;
  for (let index = 0; index < places.length; index++) {
    const place = places[index] as number;
    const cell = values.at(Math.floor(place / columns), place % columns);
    if (cell instanceof CellError) {
      return cell;
    }
    if (typeof cell === "number") {
      kept[count++] = cell;
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
