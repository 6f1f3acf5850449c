import { CellError } from "../../../call/cell.js";
import type { PlainCell } from "../../values/compareCells.js";
import type { Matrix, Operand } from "../../values/operand.js";
import { partOf } from "../../values/part.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { anything, matrix, number, omittable, value } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import { exactPlace, firstPlace, wildcardTest } from "./exactPlace.js";
import { notFound } from "./lookups.js";
import { nearestPlace, sortedPlace } from "./sortedPlace.js";
import type { Vector } from "./vector.js";
import { vectorOf } from "./vector.js";

/** How a value is matched: exactly, exactly or the next smaller (-1) or larger (1), with wildcards (2). */
const matchModes = [0, -1, 1, 2];
/** The order of search: from the first, from the last, by halving ascending (2) or descending (-2) cells. */
const searchModes = [1, -1, 2, -2];

function place(name: string, vector: Vector, wanted: PlainCell, mode: number, search: number): number | CellError {
  if (!matchModes.includes(mode)) {
    return outside(
      `${name}: match mode`,
      mode,
      "none of 0, -1, 1 and 2",
      "0 for exact, -1 or 1 for the next, 2 for wildcards is needed",
      "#VALUE!",
    );
  }
  if (!searchModes.includes(search)) {
    return outside(
      `${name}: search mode`,
      search,
      "none of 1, -1, 2 and -2",
      "1 from the first, -1 from the last is needed",
      "#VALUE!",
    );
  }
  const key = wanted ?? 0;
  const step = search === -1 ? -1 : 1;
  if (mode === 2) {
    return firstPlace(vector, step, wildcardTest(key));
  }
  const exact = step === 1 ? exactPlace(vector, key) : firstPlace(vector, -1, plainTest(key));
  if (exact >= 0 || mode === 0) {
    return exact;
  }
  if (Math.abs(search) === 2 && (mode === -1) === (search === 2)) {
    return sortedPlace(vector, key, search === 2 ? "ascending" : "descending");
  }
  return nearestPlace(vector, key, mode === 1 ? 1 : -1, step);
}

/** A test for equality in which ? and * are characters like others. */
function plainTest(key: Exclude<PlainCell, null>): (cell: unknown) => boolean {
  return wildcardTest(typeof key === "string" ? key.replace(/[*?~]/g, "~$&") : key);
}

const notOneLine = (name: string) =>
  new CellError(
    "#VALUE!",
    `${name}: searched cells are a rectangle`,
    `${name}: the cells searched have several rows and columns; one row or one column is needed, for example A2:A9`,
  );

const modes = [omittable(number("match mode"), 0), omittable(number("search mode"), 1)] as const;

const xmatch = define(
  "XMATCH",
  [value("value"), matrix("searched"), ...modes] as const,
  (wanted, searched, mode, search) => {
    const vector = vectorOf(searched);
    if (!vector) {
      return notOneLine("XMATCH");
    }
    const found = place("XMATCH", vector, wanted, mode, search);
    return typeof found === "number" ? (found < 0 ? notFound("XMATCH", wanted) : found + 1) : found;
  },
);

const xlookupParameters = [
  value("value"),
  matrix("searched"),
  matrix("results"),
  omittable<{ operand: Operand } | undefined>(anything("value if not found"), undefined),
  ...modes,
] as const;

const xlookup = define("XLOOKUP", xlookupParameters, (wanted, searched, results, otherwise, mode, search) => {
  const vector = vectorOf(searched);
  if (!vector) {
    return notOneLine("XLOOKUP");
  }
  const across = searched.rows === 1 && searched.columns > 1;
  if ((across ? results.columns : results.rows) !== vector.length) {
    return unequal(vector.length, across ? results.columns : results.rows);
  }
  const found = place("XLOOKUP", vector, wanted, mode, search);
  if (found instanceof CellError) {
    return found;
  }
  return found < 0 ? (otherwise ? otherwise.operand : notFound("XLOOKUP", wanted)) : line(results, found, across);
});

function line(results: Matrix, found: number, across: boolean): Operand {
  const part = across ? partOf(results, 0, results.rows, found, 1) : partOf(results, found, 1, 0, results.columns);
  return part.rows === 1 && part.columns === 1 && !results.reference ? part.at(0, 0) : part;
}

function unequal(searched: number, results: number): CellError {
  return new CellError(
    "#VALUE!",
    "XLOOKUP: searched cells and results of unequal length",
    `XLOOKUP: ${searched} cells are searched, the results have ${results}; as many results as cells searched are needed`,
  );
}

export const xlookups: readonly WorksheetFunction[] = [xmatch, xlookup];
