import type { Cell, ErrorCode } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import { isMatrix } from "../../values/operand.js";
import { toNumber } from "../../values/toNumber.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { anyCell, anything } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

const isError = (cell: Cell): cell is CellError => cell instanceof CellError;

/** Name and test; sections 6.13.14 to 6.13.25. */
const tests: readonly (readonly [string, (cell: Cell) => boolean])[] = [
  ["ISBLANK", (cell) => cell === null],
  ["ISERR", (cell) => isError(cell) && cell.code !== "#N/A"],
  ["ISERROR", isError],
  ["ISLOGICAL", (cell) => typeof cell === "boolean"],
  ["ISNA", (cell) => isError(cell) && cell.code === "#N/A"],
  ["ISNONTEXT", (cell) => typeof cell !== "string"],
  ["ISNUMBER", (cell) => typeof cell === "number"],
  ["ISTEXT", (cell) => typeof cell === "string"],
];

const parity = (name: string, odd: 0 | 1) =>
  define(name, [anyCell("number")] as const, ({ cell }) => {
    const number = typeof cell === "boolean" ? notANumber(name, cell) : toNumber(cell, `${name}: number`);
    return typeof number === "number" ? Math.abs(Math.trunc(number)) % 2 === odd : number;
  });

const notANumber = (name: string, cell: Cell) =>
  outside(`${name}: number`, cell, "a logical", "a number is needed, for example 3", "#VALUE!");

/** Section 6.13.11. */
const errorNumbers: Readonly<Record<ErrorCode, number>> = {
  "#NULL!": 1,
  "#DIV/0!": 2,
  "#VALUE!": 3,
  "#REF!": 4,
  "#NAME?": 5,
  "#NUM!": 6,
  "#N/A": 7,
};

function typeNumber(cell: Cell): number {
  return isError(cell) ? 16 : typeof cell === "string" ? 2 : typeof cell === "boolean" ? 4 : 1;
}

/** Section 6.13. */
export const informations: readonly WorksheetFunction[] = [
  ...tests.map(([name, holds]) => define(name, [anyCell("value")] as const, ({ cell }) => holds(cell))),
  parity("ISEVEN", 0),
  parity("ISODD", 1),
  define("ISREF", [anything("value")] as const, ({ operand }) => isMatrix(operand) && operand.reference),
  define(
    "NA",
    [] as const,
    () =>
      new CellError(
        "#N/A",
        "NA: marked as not available",
        "NA: the value is marked as not available; a value in its place is needed",
      ),
  ),
  define("ERROR.TYPE", [anyCell("value")] as const, ({ cell }) =>
    isError(cell)
      ? errorNumbers[cell.code]
      : outside("ERROR.TYPE: value", cell, "no error", "a cell with an error is needed", "#N/A"),
  ),
  define("TYPE", [anything("value")] as const, ({ operand }) => {
    if (!isMatrix(operand)) {
      return typeNumber(operand);
    }
    return operand.rows === 1 && operand.columns === 1 ? typeNumber(operand.at(0, 0)) : 64;
  }),
];
