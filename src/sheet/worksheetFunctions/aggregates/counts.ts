import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import { numberFromText } from "../../values/numberFromText.js";
import type { Matrix, Operand } from "../../values/operand.js";
import { isMatrix } from "../../values/operand.js";
import { define } from "../define/define.js";
import { anything, matrix, rest } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

/** How many cells of a rectangle are of a kind; packed columns are counted without looking at every number. */
function countCells(range: Matrix, isCounted: (cell: Cell) => boolean): number {
  const numbersCount = isCounted(0);
  let count = 0;
  for (let column = 0; column < range.columns; column++) {
    const packed = range.block?.columns[column];
    if (packed && packed.others === undefined) {
      count += numbersCount ? range.rows : 0;
    } else {
      for (let row = 0; row < range.rows; row++) {
        count += isCounted(range.at(row, column)) ? 1 : 0;
      }
    }
  }
  return count;
}

function total(
  given: readonly { operand: Operand }[],
  inRange: (cell: Cell) => boolean,
  alone: (cell: Cell) => boolean,
): number {
  let count = 0;
  for (const { operand } of given) {
    count += isMatrix(operand) ? countCells(operand, inRange) : alone(operand) ? 1 : 0;
  }
  return count;
}

const isNumber = (cell: Cell) => typeof cell === "number";

/** A value typed as an argument counts where it converts to a number. */
const readsAsNumber = (cell: Cell) =>
  cell === null ||
  isNumber(cell) ||
  typeof cell === "boolean" ||
  (typeof cell === "string" && numberFromText(cell) !== undefined);

const isFilled = (cell: Cell) => cell !== null;

/** Sections 6.13.6 to 6.13.8. COUNT and COUNTA take errors as cells like any other. */
export const counts: readonly WorksheetFunction[] = [
  define("COUNT", [rest(anything("value"))] as const, (given) => total(given, isNumber, readsAsNumber)),
  define("COUNTA", [rest(anything("value"))] as const, (given) => total(given, isFilled, () => true)),
  define("COUNTBLANK", [matrix("range")] as const, (range) =>
    countCells(range, (cell) => cell === null || cell === ""),
  ),
  define("ROWS", [matrix("range")] as const, (range) => errorOf(range) ?? range.rows),
  define("COLUMNS", [matrix("range")] as const, (range) => errorOf(range) ?? range.columns),
];

/** An error that stands for a rectangle, as where a reference is gone. */
function errorOf(range: Matrix): CellError | undefined {
  const first = range.rows === 1 && range.columns === 1 && !range.reference ? range.at(0, 0) : undefined;
  return first instanceof CellError ? first : undefined;
}
