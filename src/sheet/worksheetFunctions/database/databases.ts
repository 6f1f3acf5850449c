import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import { foldCase } from "../../values/compareCells.js";
import type { Matrix } from "../../values/operand.js";
import {
  average,
  largest,
  populationDeviation,
  populationVariance,
  product,
  sampleDeviation,
  sampleVariance,
  smallest,
} from "../aggregates/summaries.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { matrix, value } from "../define/parameters.js";
import type { Condition } from "../gather/criterion.js";
import { conditionOf } from "../gather/criterion.js";
import { sum } from "../numerics/sum.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

type Field = number | string | boolean | null;

/** The column of a field, by its header or its number; undefined where there is none. */
function columnOfField(database: Matrix, field: Field): number | undefined {
  if (typeof field === "string") {
    const wanted = foldCase(field);
    for (let column = 0; column < database.columns; column++) {
      const header = database.at(0, column);
      if (typeof header === "string" && foldCase(header) === wanted) {
        return column;
      }
    }
    return undefined;
  }
  return typeof field === "number" && field >= 1 && field <= database.columns ? Math.trunc(field) - 1 : undefined;
}

interface Test {
  readonly column: number;
  readonly holds: Condition;
}

/** Rows of criteria: within a row all must hold, of the rows any (section 4.11.11). Blank cells ask for nothing. */
function criteriaRows(database: Matrix, criteria: Matrix): Test[][] {
  return Array.from({ length: criteria.rows - 1 }, (_, index) => {
    const tests: Test[] = [];
    for (let column = 0; column < criteria.columns; column++) {
      const criterion = criteria.at(index + 1, column);
      const field = columnOfField(database, criteria.at(0, column) as Field);
      if (criterion !== null && field !== undefined) {
        tests.push({ column: field, holds: conditionOf(criterion) });
      }
    }
    return tests;
  });
}

/** The cells of a field in the records that meet the criteria. */
function found(name: string, database: Matrix, field: Field, criteria: Matrix): Cell[] | CellError {
  const column = field === null ? undefined : columnOfField(database, field);
  if (column === undefined && field !== null) {
    return outside(
      `${name}: field`,
      field,
      "no header of the records",
      "a header or the number of a column is needed, for example 1",
      "#VALUE!",
    );
  }
  const rows = criteriaRows(database, criteria);
  const cells: Cell[] = [];
  for (let row = 1; row < database.rows; row++) {
    if (rows.some((tests) => tests.every((test) => test.holds(database.at(row, test.column))))) {
      cells.push(column === undefined ? 1 : database.at(row, column));
    }
  }
  return cells;
}

function define3(name: string, summary: (cells: Cell[]) => Cell): WorksheetFunction {
  return define(name, [matrix("records"), value("field"), matrix("criteria")] as const, (database, field, criteria) => {
    const cells = found(name, database, field, criteria);
    return cells instanceof CellError ? cells : summary(cells);
  });
}

type Summary = (numbers: Float64Array, name: string) => number | CellError;

const ofNumbers = (name: string, summary: Summary) =>
  define3(name, (cells) => {
    const error = cells.find((cell) => cell instanceof CellError);
    return error ?? summary(Float64Array.from(cells.filter((cell) => typeof cell === "number")), name);
  });

const onlyOne = (cells: Cell[]): Cell => {
  if (cells.length === 1) {
    return cells[0] as Cell;
  }
  return cells.length === 0
    ? new CellError(
        "#VALUE!",
        "DGET: no record fits",
        "DGET: no record meets the criteria; criteria that one record meets are needed",
      )
    : new CellError(
        "#NUM!",
        "DGET: several records fit",
        `DGET: ${cells.length} records meet the criteria; criteria that one record meets are needed`,
      );
};

/** Section 6.9. */
export const databases: readonly WorksheetFunction[] = [
  ofNumbers("DSUM", sum),
  ofNumbers("DAVERAGE", average),
  ofNumbers("DMAX", largest),
  ofNumbers("DMIN", smallest),
  ofNumbers("DPRODUCT", product),
  ofNumbers("DSTDEV", sampleDeviation),
  ofNumbers("DSTDEVP", populationDeviation),
  ofNumbers("DVAR", sampleVariance),
  ofNumbers("DVARP", populationVariance),
  define3("DCOUNT", (cells) => cells.filter((cell) => typeof cell === "number").length),
  define3("DCOUNTA", (cells) => cells.filter((cell) => cell !== null).length),
  define3("DGET", onlyOne),
];
