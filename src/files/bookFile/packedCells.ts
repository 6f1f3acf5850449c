import { CellError, type ErrorCode } from "../../call/cell.js";
import type { Column, OtherCell } from "../../call/column.js";
import { sliceColumn } from "../../call/column.js";

export interface PackedError {
  readonly error: ErrorCode;
  readonly topic: string;
  readonly message: string;
}

export type PackedOther = Exclude<OtherCell, CellError> | PackedError;

/** Cells below each other as plain data, which can be copied, stored and compared; like a Column otherwise. */
export interface PackedCells {
  /** The row of the first. */
  readonly row: number;
  readonly numbers: Float64Array;
  readonly others: readonly (PackedOther | undefined)[] | undefined;
}

/** Rows `from` up to `to` of a column, without the blank ones at both ends; undefined where all are blank. */
export function packCells(column: Column, from: number, to: number, row = from): PackedCells | undefined {
  let [first, end] = [from, to];
  while (first < end && column.others?.[first] === null) first++;
  while (first < end && column.others?.[end - 1] === null) end--;
  if (first === end) return undefined;
  const { numbers, others } = sliceColumn(column, first, end);
  return {
    row: row + first - from,
    numbers: numbers.slice(),
    others: others?.some((other) => other !== undefined) ? others.map(packOther) : undefined,
  };
}

export function unpackCells({ numbers, others }: PackedCells): Column {
  return { length: numbers.length, numbers, others: others?.map(unpackOther) };
}

function packOther(cell: OtherCell | undefined): PackedOther | undefined {
  if (!(cell instanceof CellError)) return cell;
  return { error: cell.code, topic: cell.topic, message: cell.message };
}

function unpackOther(packed: PackedOther | undefined): OtherCell | undefined {
  if (typeof packed !== "object" || packed === null) return packed;
  return new CellError(packed.error, packed.topic, packed.message);
}
