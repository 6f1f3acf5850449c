import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import type { Matrix, Operand } from "../../values/operand.js";
import { buildMatrix } from "../../values/operand.js";
import { tableOf } from "../arrays/matrices.js";
import { define, notFinite } from "../define/define.js";
import { outside } from "../define/outside.js";
import { logical, matrix, omittable } from "../define/parameters.js";
import type { Fit } from "../numerics/leastSquares.js";
import { leastSquares } from "../numerics/leastSquares.js";
import type { Table } from "../numerics/linear.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

interface Known {
  readonly y: Float64Array;
  readonly xs: readonly Float64Array[];
  /** Whether each variable is a row, as where the known y lie in a row. */
  readonly across: boolean;
}

function lineOf(table: Table, line: number, across: boolean): Float64Array {
  const length = across ? table.columns : table.rows;
  return Float64Array.from(
    { length },
    (_, index) => table.values[across ? line * table.columns + index : index * table.columns + line] as number,
  );
}

/** The known y and x as numbers; x left out are 1, 2, 3 ... */
function known(name: string, knownY: Matrix, knownX: Matrix | undefined): Known | CellError {
  const y = tableOf(knownY, name);
  if (y instanceof CellError) {
    return y;
  }
  const across = y.rows === 1 && y.columns > 1;
  if (!knownX) {
    return { y: y.values, xs: [Float64Array.from(y.values, (_, index) => index + 1)], across };
  }
  const x = tableOf(knownX, name);
  if (x instanceof CellError) {
    return x;
  }
  if (x.values.length === y.values.length && (x.rows === y.rows || y.rows === 1 || y.columns === 1)) {
    return { y: y.values, xs: [x.values], across };
  }
  const fits = across ? x.columns === y.columns : y.columns === 1 && x.rows === y.rows;
  return fits ? { y: y.values, xs: variablesOf(x, across), across } : unequal(name, y, x);
}

function variablesOf(x: Table, across: boolean): Float64Array[] {
  return Array.from({ length: across ? x.rows : x.columns }, (_, line) => lineOf(x, line, across));
}

function unequal(name: string, y: Table, x: Table): CellError {
  return new CellError(
    "#REF!",
    `${name}: known y and x of unequal size`,
    `${name}: known y are ${y.rows} x ${y.columns}, known x ${x.rows} x ${x.columns} cells; one line of x for each y is needed`,
  );
}

const knownParameters = [matrix("known y"), omittable<Matrix | undefined>(matrix("known x"), undefined)] as const;

function logarithms(name: string, data: Known): Known | CellError {
  const wrong = data.y.find((each) => each <= 0);
  return wrong === undefined
    ? { ...data, y: data.y.map(Math.log) }
    : outside(`${name}: known y`, wrong, "not above 0", "numbers above 0 are needed, for example 2, 4, 8");
}

function fitOf(
  name: string,
  knownY: Matrix,
  knownX: Matrix | undefined,
  withIntercept: boolean,
  exponential: boolean,
): { fit: Fit; data: Known } | CellError {
  const linear = known(name, knownY, knownX);
  const data = linear instanceof CellError || !exponential ? linear : logarithms(name, linear);
  return data instanceof CellError ? data : { fit: leastSquares(data.y, data.xs, withIntercept), data };
}

const notAvailable = (name: string) =>
  new CellError(
    "#N/A",
    `${name}: nothing stands here`,
    `${name}: this place of the statistics stays empty; the rows above hold the fit`,
  );

/** Sections 6.18.41 and 6.18.42: coefficients with the last variable first; on request their errors and the quality. */
const fitTable = (name: string, exponential: boolean) =>
  define(
    name,
    [...knownParameters, omittable(logical("constant"), true), omittable(logical("statistics"), false)] as const,
    (knownY, knownX, constant, statistics) => {
      const found = fitOf(name, knownY, knownX, constant, exponential);
      if (found instanceof CellError) {
        return found;
      }
      const { fit } = found;
      const back = exponential ? Math.exp : (each: number) => each;
      const { freedom, residualSquares, explainedSquares } = fit;
      const rows: number[][] = [
        [...fit.slopes.toReversed(), fit.intercept].map(back),
        [...fit.slopeErrors.toReversed(), constant ? fit.interceptError : Number.NaN],
        [explainedSquares / (explainedSquares + residualSquares), Math.sqrt(residualSquares / freedom)],
        [
          explainedSquares / (found.data.y.length - freedom - (constant ? 1 : 0)) / (residualSquares / freedom),
          freedom,
        ],
        [explainedSquares, residualSquares],
      ];
      return buildMatrix(statistics ? 5 : 1, fit.slopes.length + 1, (row, column) => {
        const value = (rows[row] as number[])[column];
        return value === undefined || (row === 1 && !constant && column === fit.slopes.length)
          ? notAvailable(name)
          : Number.isFinite(value)
            ? value
            : notFinite(name);
      });
    },
  );

/** Sections 6.18.79 and 6.18.35: values of the fit at new x, which lie as the known x do. */
const prediction = (name: string, exponential: boolean) =>
  define(
    name,
    [
      ...knownParameters,
      omittable<Matrix | undefined>(matrix("new x"), undefined),
      omittable(logical("constant"), true),
    ] as const,
    (knownY, knownX, newX, constant): Operand => {
      const found = fitOf(name, knownY, knownX, constant, exponential);
      if (found instanceof CellError) {
        return found;
      }
      const { fit, data } = found;
      const back = exponential ? Math.exp : (each: number) => each;
      const value = (xs: readonly number[]): Cell => {
        const result = back(
          fit.slopes.reduce((total, slope, index) => total + slope * (xs[index] as number), fit.intercept),
        );
        return Number.isFinite(result) ? result : notFinite(name);
      };
      if (!newX) {
        return buildMatrix(knownY.rows, knownY.columns, (row, column) =>
          value(data.xs.map((x) => x[row * knownY.columns + column] as number)),
        );
      }
      const table = tableOf(newX, name);
      return table instanceof CellError ? table : predicted(name, table, data, value);
    },
  );

function predicted(name: string, table: Table, data: Known, value: (xs: readonly number[]) => Cell): Operand {
  if (data.xs.length === 1) {
    return buildMatrix(table.rows, table.columns, (row, column) =>
      value([table.values[row * table.columns + column] as number]),
    );
  }
  const lines = variablesOf(table, data.across);
  if (lines.length !== data.xs.length) {
    return new CellError(
      "#REF!",
      `${name}: new x of another count`,
      `${name}: new x hold ${lines.length} variables, known x ${data.xs.length}; as many are needed`,
    );
  }
  const at = (index: number) => value(lines.map((line) => line[index] as number));
  return data.across
    ? buildMatrix(1, table.columns, (_, column) => at(column))
    : buildMatrix(table.rows, 1, (row) => at(row));
}

export const regressions: readonly WorksheetFunction[] = [
  fitTable("LINEST", false),
  fitTable("LOGEST", true),
  prediction("TREND", false),
  prediction("GROWTH", true),
];
