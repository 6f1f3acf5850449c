import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import { compareCells, isPlain } from "../../values/compareCells.js";
import type { Operand } from "../../values/operand.js";
import { isMatrix } from "../../values/operand.js";
import { toLogical } from "../../values/toLogical.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { anyCell, anything, logical, optional, rest, restInPairs, whole } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

interface Holder {
  readonly cell: Cell;
}

/**
 * The logicals in the arguments. Of a rectangle text and blanks are left out; its numbers count, which section 6.3.13
 * leaves to evaluators whose numbers are no logicals. A value typed as an argument is converted.
 */
function logicalsOf(name: string, given: readonly { operand: Operand }[]): boolean[] | CellError {
  const found: boolean[] = [];
  for (const { operand } of given) {
    const problem = isMatrix(operand)
      ? addCells(found, operand)
      : addValue(found, toLogical(operand, `${name}: condition`));
    if (problem) {
      return problem;
    }
  }
  return found.length > 0
    ? found
    : new CellError(
        "#VALUE!",
        `${name}: no conditions`,
        `${name}: the cells hold no TRUE, FALSE or number; at least one is needed, for example A2>5`,
      );
}

function addValue(found: boolean[], value: boolean | CellError): CellError | undefined {
  if (value instanceof CellError) {
    return value;
  }
  found.push(value);
  return undefined;
}

function addCells(found: boolean[], range: Exclude<Operand, Cell>): CellError | undefined {
  for (let row = 0; row < range.rows; row++) {
    for (let column = 0; column < range.columns; column++) {
      const cell = range.at(row, column);
      if (cell instanceof CellError) {
        return cell;
      }
      if (typeof cell === "boolean" || typeof cell === "number") {
        found.push(cell !== false && cell !== 0);
      }
    }
  }
  return undefined;
}

const ofLogicals = (name: string, combine: (found: boolean[]) => boolean) =>
  define(name, [rest(anything("condition"))] as const, (given) => {
    const found = logicalsOf(name, given);
    return found instanceof CellError ? found : combine(found);
  });

const isNotAvailable = (cell: Cell) => cell instanceof CellError && cell.code === "#N/A";

const noneHolds = (name: string, what: string) =>
  new CellError(
    "#N/A",
    `${name}: ${what}`,
    `${name}: ${what}; a last case that always holds is needed, for example TRUE, 0`,
  );

/** A result that a choice gives back: a blank cell chosen is 0, as any formula shows it. */
const chosen = ({ cell }: Holder): Cell => cell;

function firstHolding(pairs: readonly (readonly [Holder, Holder])[]): Cell {
  for (const [condition, result] of pairs) {
    const holds = toLogical(condition.cell, "IFS: condition");
    if (holds instanceof CellError) {
      return holds;
    }
    if (holds) {
      return chosen(result);
    }
  }
  return noneHolds("IFS", "no condition is TRUE");
}

function firstEqual(value: Cell, cases: readonly Holder[]): Cell {
  if (!isPlain(value)) {
    return value;
  }
  for (let index = 0; index + 1 < cases.length; index += 2) {
    const candidate = (cases[index] as Holder).cell;
    if (!isPlain(candidate)) {
      return candidate;
    }
    if (typeof candidate === typeof value || candidate === null || value === null) {
      if (compareCells(value, candidate) === 0) {
        return chosen(cases[index + 1] as Holder);
      }
    }
  }
  return cases.length % 2 === 1 ? chosen(cases.at(-1) as Holder) : noneHolds("SWITCH", "no case equals the value");
}

/** Sections 6.14.3 and 6.15; every argument is worked out before the function chooses. */
export const logicals: readonly WorksheetFunction[] = [
  define("TRUE", [] as const, () => true),
  define("FALSE", [] as const, () => false),
  ofLogicals("AND", (found) => found.every(Boolean)),
  ofLogicals("OR", (found) => found.some(Boolean)),
  ofLogicals("XOR", (found) => found.filter(Boolean).length % 2 === 1),
  define("NOT", [logical("condition")] as const, (condition) => !condition),
  define(
    "IF",
    [
      logical("condition"),
      optional(anyCell("value if TRUE"), { cell: true }),
      optional(anyCell("value if FALSE"), { cell: false }),
    ] as const,
    (condition, ifTrue, ifFalse) => orZero(condition ? ifTrue : ifFalse),
  ),
  define("IFERROR", [anyCell("value"), anyCell("value if error")] as const, (value, other) =>
    orZero(value.cell instanceof CellError ? other : value),
  ),
  define("IFNA", [anyCell("value"), anyCell("value if #N/A")] as const, (value, other) =>
    orZero(isNotAvailable(value.cell) ? other : value),
  ),
  define("IFS", [restInPairs(anyCell("condition"), anyCell("value"))] as const, (pairs) => firstHolding(pairs)),
  define("SWITCH", [anyCell("value"), rest(anyCell("case"), 2)] as const, ({ cell }, cases) => firstEqual(cell, cases)),
  define("CHOOSE", [whole("place"), rest(anything("value"))] as const, (place, values) => {
    const choice = values[place - 1];
    return choice
      ? choice.operand
      : outside(
          "CHOOSE: place",
          place,
          `outside 1 to ${values.length}`,
          "the place of one of the values is needed, for example 1",
          "#VALUE!",
        );
  }),
];

/** An argument left empty, as in IF(A1,,2), is 0. */
function orZero({ cell }: Holder): Cell {
  return cell ?? 0;
}
