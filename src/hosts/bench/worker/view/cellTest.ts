import type { Cell } from "../../../../call/cell.js";
import { CellError } from "../../../../call/cell.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import { toText } from "../../../../sheet/values/toText.js";
import { kindPhrase } from "../../../../units/kind.js";
import { isProblem } from "../../../../units/problem.js";
import { readQuantity } from "../../../../units/readQuantity.js";
import { convertible, fromBase, one, toBase, type Unit } from "../../../../units/unit.js";
import type { FilterCondition } from "../../protocol/request.js";

type Keeps = (cell: Cell) => boolean;

/** Whether a cell meets a condition; numbers are compared in the unit of their column. */
export function cellTest(condition: FilterCondition, name: string, unit: Unit | undefined): Keeps {
  const { test, text } = condition;
  switch (test) {
    case "blank":
      return isBlank;
    case "not blank":
      return (cell) => !isBlank(cell);
    case "holds error":
      return (cell) => cell instanceof CellError;
    case "contains": {
      const wanted = text.toLowerCase();
      return (cell) => {
        const shown = toText(cell);
        return typeof shown === "string" && shown.toLowerCase().includes(wanted);
      };
    }
    default:
      return comparison(test, text, name, unit);
  }
}

function isBlank(cell: Cell): boolean {
  return cell === null || cell === "";
}

function comparison(
  test: "=" | "<>" | "<" | "<=" | ">" | ">=",
  text: string,
  name: string,
  unit: Unit | undefined,
): Keeps {
  const limit = limitOf(text, name, unit);
  if (limit === undefined) {
    if (test !== "=" && test !== "<>") {
      throw new EditRefused(
        `filter: ${name} ${test} "${text}" compares with a text that is no number; type a number, for example ${test} 10, or choose "contains"`,
      );
    }
    const wanted = text.trim().toLowerCase();
    const equal: Keeps = (cell) => !(cell instanceof CellError) && String(toText(cell)).trim().toLowerCase() === wanted;
    return test === "=" ? equal : (cell) => !equal(cell);
  }
  const compare = comparisons[test];
  return (cell) => {
    const value = typeof cell === "number" ? cell : typeof cell === "string" ? numberOfText(cell, unit) : undefined;
    return value === undefined ? test === "<>" : compare(value, limit);
  };
}

const comparisons: Readonly<Record<"=" | "<>" | "<" | "<=" | ">" | ">=", (value: number, limit: number) => boolean>> = {
  "=": (value, limit) => value === limit,
  "<>": (value, limit) => value !== limit,
  "<": (value, limit) => value < limit,
  "<=": (value, limit) => value <= limit,
  ">": (value, limit) => value > limit,
  ">=": (value, limit) => value >= limit,
};

/** What numbers are compared with, in the column's unit; undefined where the text is no number. */
function limitOf(text: string, name: string, unit: Unit | undefined): number | undefined {
  const read = readQuantity(text);
  if (isProblem(read)) return undefined;
  if (read.unit === undefined || read.unit.text === (unit ?? one).text) return read.value;
  if (unit === undefined) {
    throw new EditRefused(
      `filter: ${name} states no unit to compare ${text} with; type a plain number, or give the column its unit`,
    );
  }
  if (!convertible(read.unit, unit)) {
    throw new EditRefused(
      `filter: ${text} is ${kindPhrase(read.unit.kind)}, and ${name} is in ${unit.text}, ${kindPhrase(unit.kind)}; type a value in ${unit.text} or in a unit that converts to it`,
    );
  }
  return fromBase(unit, toBase(read.unit, read.value));
}

/** A quantity text as a number in the column's unit. */
function numberOfText(text: string, unit: Unit | undefined): number | undefined {
  const read = readQuantity(text);
  if (isProblem(read)) return undefined;
  if (read.unit === undefined || read.unit.text === (unit ?? one).text) return read.value;
  return unit && convertible(read.unit, unit) ? fromBase(unit, toBase(read.unit, read.value)) : undefined;
}
