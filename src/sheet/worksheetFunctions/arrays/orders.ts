import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import { compareCells, foldCase, isPlain } from "../../values/compareCells.js";
import type { Matrix, Operand } from "../../values/operand.js";
import { buildMatrix } from "../../values/operand.js";
import { toLogical } from "../../values/toLogical.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { anything, logical, matrix, number, omittable, restInPairs, whole } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

/** The order of a sort: values as comparisons have them, then errors, blanks last in either direction. */
function order(left: Cell, right: Cell, direction: number): number {
  const [a, b] = [place(left), place(right)];
  if (a !== b || a > 0) {
    // Errors go with the direction, blanks do not.
    return a === 2 || b === 2 ? a - b : direction * (a - b);
  }
  return isPlain(left) && isPlain(right) ? direction * compareCells(left, right) : 0;
}

function place(cell: Cell): number {
  return cell === null ? 2 : cell instanceof CellError ? 1 : 0;
}

interface Key {
  at(line: number): Cell;
  readonly direction: number;
}

/** The lines in the order of the keys; equal lines keep their order. */
function sortedLines(count: number, keys: readonly Key[]): number[] {
  return Array.from({ length: count }, (_, line) => line).sort((a, b) => {
    for (const key of keys) {
      const result = order(key.at(a), key.at(b), key.direction);
      if (result !== 0) {
        return result;
      }
    }
    return a - b;
  });
}

function arranged(array: Matrix, lines: readonly number[], byColumn: boolean): Matrix {
  return byColumn
    ? buildMatrix(array.rows, lines.length, (row, column) => array.at(row, lines[column] as number))
    : buildMatrix(lines.length, array.columns, (row, column) => array.at(lines[row] as number, column));
}

const wrongDirection = (name: string, direction: Cell) =>
  direction === 1 || direction === -1
    ? undefined
    : outside(
        `${name}: order`,
        direction,
        "neither 1 nor -1",
        "1 for ascending or -1 for descending is needed",
        "#VALUE!",
      );

const sort = define(
  "SORT",
  [
    matrix("array"),
    omittable(whole("key"), 1),
    omittable(number("order"), 1),
    omittable(logical("by column"), false),
  ] as const,
  (array, key, direction, byColumn) => {
    const keys = byColumn ? array.rows : array.columns;
    if (key < 1 || key > keys) {
      return outside(
        "SORT: key",
        key,
        `outside 1 to ${keys}`,
        "a column of the array is needed, for example 1",
        "#VALUE!",
      );
    }
    const at = byColumn ? (line: number) => array.at(key - 1, line) : (line: number) => array.at(line, key - 1);
    return (
      wrongDirection("SORT", direction) ??
      arranged(array, sortedLines(byColumn ? array.columns : array.rows, [{ at, direction }]), byColumn)
    );
  },
);

type Keys = readonly (readonly [Matrix, Operand])[];

function sortBy(array: Matrix, pairs: Keys): Operand {
  const byColumn = (pairs[0]?.[0].rows ?? 0) === 1 && array.columns > 1 && pairs[0]?.[0].columns === array.columns;
  const count = byColumn ? array.columns : array.rows;
  const keys: Key[] = [];
  for (const [by, direction] of pairs) {
    const problem = wrongDirection("SORTBY", direction as Cell);
    if (problem) {
      return problem;
    }
    if (by.rows * by.columns !== count || (by.rows !== 1 && by.columns !== 1)) {
      return new CellError(
        "#VALUE!",
        "SORTBY: key of another length",
        `SORTBY: a key has ${by.rows * by.columns} cells, the array ${count} lines; a key with one cell a line is needed`,
      );
    }
    keys.push({
      at: by.columns === 1 ? (line) => by.at(line, 0) : (line) => by.at(0, line),
      direction: direction as number,
    });
  }
  return arranged(array, sortedLines(count, keys), byColumn);
}

/** The last key may come without its order. */
const sortByKeys = define(
  "SORTBY",
  [matrix("array"), restInPairs(matrix("key"), number("order"))] as const,
  (array, pairs) => sortBy(array, pairs),
);
const sortByFunction: WorksheetFunction = {
  ...sortByKeys,
  leastArguments: 2,
  call: (given) =>
    sortByKeys.call(
      given.length % 2 === 0
        ? [...given, 1]
        : given.map((each, index) => (index > 0 && index % 2 === 0 ? (each ?? 1) : each)),
    ),
};

function keyOf(cell: Cell): string {
  if (cell === null) {
    return "blank";
  }
  if (cell instanceof CellError) {
    return cell.code;
  }
  return typeof cell === "string" ? `text ${foldCase(cell)}` : `${typeof cell} ${cell === 0 ? 0 : cell}`;
}

const unique = define(
  "UNIQUE",
  [matrix("array"), omittable(logical("by column"), false), omittable(logical("only once"), false)] as const,
  (array, byColumn, onlyOnce) => {
    const count = byColumn ? array.columns : array.rows;
    const width = byColumn ? array.rows : array.columns;
    const seen = new Map<string, { line: number; times: number }>();
    for (let line = 0; line < count; line++) {
      const key = Array.from({ length: width }, (_, other) =>
        keyOf(byColumn ? array.at(other, line) : array.at(line, other)),
      ).join("\u0000");
      const known = seen.get(key);
      if (known) {
        known.times += 1;
      } else {
        seen.set(key, { line, times: 1 });
      }
    }
    const lines = [...seen.values()].filter((each) => !onlyOnce || each.times === 1).map((each) => each.line);
    return lines.length > 0 ? arranged(array, lines, byColumn) : nothing("UNIQUE", "no line comes only once");
  },
);

const nothing = (name: string, why: string) =>
  new CellError("#N/A", `${name}: ${why}`, `${name}: ${why}; a value for that case or another condition is needed`);

const filter = define(
  "FILTER",
  [
    matrix("array"),
    matrix("condition"),
    omittable<{ operand: Operand } | undefined>(anything("value if none"), undefined),
  ] as const,
  (array, condition, otherwise) => {
    const byColumn = condition.rows === 1 && condition.columns === array.columns && array.columns > 1;
    const count = byColumn ? array.columns : array.rows;
    if (condition.rows * condition.columns !== count || (condition.rows !== 1 && condition.columns !== 1)) {
      return new CellError(
        "#VALUE!",
        "FILTER: condition of another length",
        `FILTER: the condition has ${condition.rows * condition.columns} cells, the array ${count} lines; one cell a line is needed, for example B2:B9>5`,
      );
    }
    const lines: number[] = [];
    for (let line = 0; line < count; line++) {
      const holds = toLogical(
        condition.rows === 1 ? condition.at(0, line) : condition.at(line, 0),
        "FILTER: condition",
      );
      if (holds instanceof CellError) {
        return holds;
      }
      if (holds) {
        lines.push(line);
      }
    }
    return lines.length > 0
      ? arranged(array, lines, byColumn)
      : otherwise
        ? otherwise.operand
        : nothing("FILTER", "no line fulfils the condition");
  },
);

export const orders: readonly WorksheetFunction[] = [sort, sortByFunction, unique, filter];
