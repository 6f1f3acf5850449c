import { CellError } from "../../call/cell.js";
import type { Column } from "../../call/column.js";
import { nearest } from "../../units/nearest.js";
import { addressText } from "../book/address.js";
import { goneError } from "../formula/goneError.js";
import type { Rectangle, Reference } from "../formula/reference.js";
import { isOnSheet, resolve } from "../formula/reference.js";
import { mostColumns, mostRows } from "../limits.js";
import type { Matrix } from "../values/operand.js";
import type { World } from "./world.js";

/** Cells of one sheet that a reference in one cell means. */
export interface Target extends Rectangle {
  readonly sheet: number;
}

/** What a reference means in one cell; whole columns and rows end where the cells in them do. */
export function targetOf(
  world: World,
  reference: Reference | undefined,
  sheet: number,
  row: number,
  column: number,
): Target | CellError {
  if (reference === undefined) {
    return goneError;
  }
  const index = reference.sheet === undefined ? sheet : world.sheetIndex(reference.sheet);
  if (index < 0) {
    return noSheetError(world, reference.sheet as string);
  }
  const area = resolve(reference, row, column);
  if (!isOnSheet(area)) {
    return goneError;
  }
  return { sheet: index, ...(reference.whole === undefined ? area : withinUse(world, index, area)) };
}

function withinUse(world: World, sheet: number, area: Rectangle): Rectangle {
  const right = area.right === mostColumns - 1 ? Math.max(area.left, world.usedColumns(sheet) - 1) : area.right;
  if (area.bottom < mostRows - 1) {
    return { ...area, right };
  }
  let rows = 1;
  for (let column = area.left; column <= right; column++) {
    rows = Math.max(rows, world.usedRows(sheet, column));
  }
  return { ...area, right, bottom: Math.max(area.top, rows - 1) };
}

/** The cells of a target, read when they are asked for. */
export function matrixOf(world: World, target: Target): Matrix {
  const { sheet, top, left, bottom, right } = target;
  const rows = bottom - top + 1;
  const columns = right - left + 1;
  let block: { rows: number; columns: readonly Column[] } | undefined;
  return {
    rows,
    columns,
    reference: true,
    at: (row, column) => world.read(sheet, top + row, left + column),
    get block() {
      block ??= {
        rows,
        columns: Array.from({ length: columns }, (_, column) => world.slice(sheet, left + column, top, bottom + 1)),
      };
      return block;
    },
  };
}

/** `A2#`: all cells the formula in A2 filled. */
export function spillTarget(world: World, target: Target): Target {
  const size = world.spillAt(target.sheet, target.top, target.left);
  return size === undefined
    ? target
    : { ...target, bottom: target.top + size.rows - 1, right: target.left + size.width - 1 };
}

function noSheetError(world: World, name: string): CellError {
  return new CellError("#REF!", `no sheet "${name}"`, () => {
    const near = nearest(
      name.toUpperCase(),
      world.sheetNames().map((each) => each.toUpperCase()),
    );
    const index = world.sheetNames().findIndex((each) => each.toUpperCase() === near);
    const proposal = index < 0 ? world.sheetNames()[0] : world.sheetNames()[index];
    return `"${name}" is no sheet of this book; the name of a sheet is needed, for example ${addressText(0, 0, proposal)}`;
  });
}
