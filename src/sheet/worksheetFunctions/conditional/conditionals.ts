import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import type { Matrix } from "../../values/operand.js";
import { average, largest, smallest } from "../aggregates/summaries.js";
import { define } from "../define/define.js";
import { anyCell, matrix, omittable, restInPairs } from "../define/parameters.js";
import { matchingOf, numbersWhere } from "../gather/matching.js";
import { sum } from "../numerics/sum.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

type Summary = (numbers: Float64Array, name: string) => number | CellError;
type Pairs = readonly (readonly [Matrix, { readonly cell: Cell }])[];

function summarised(name: string, pairs: Pairs, values: Matrix, summary: Summary): number | CellError {
  const matching = matchingOf(pairs, name);
  if (matching instanceof CellError) {
    return matching;
  }
  const numbers = numbersWhere(matching, values, name);
  return numbers instanceof CellError ? numbers : summary(numbers, name);
}

function counted(name: string, pairs: Pairs): number | CellError {
  const matching = matchingOf(pairs, name);
  return matching instanceof CellError ? matching : matching.places.length;
}

const ofOneCondition = (name: string, summary: Summary) =>
  define(
    name,
    [
      matrix("range"),
      anyCell("criterion"),
      omittable<Matrix | undefined>(matrix(`${summary === sum ? "sum" : "average"} range`), undefined),
    ] as const,
    (range, criterion, values) => summarised(name, [[range, criterion]], values ?? range, summary),
  );

const ofConditions = (name: string, summary: Summary) =>
  define(name, [matrix("values"), restInPairs(matrix("range"), anyCell("criterion"))] as const, (values, pairs) =>
    summarised(name, pairs, values, summary),
  );

/** Sections 6.13.9, 6.13.10, 6.16.62, 6.16.63, 6.18.5 and 6.18.6; MINIFS and MAXIFS alike. */
export const conditionals: readonly WorksheetFunction[] = [
  define("COUNTIF", [matrix("range"), anyCell("criterion")] as const, (range, criterion) =>
    counted("COUNTIF", [[range, criterion]]),
  ),
  define("COUNTIFS", [restInPairs(matrix("range"), anyCell("criterion"))] as const, (pairs) =>
    counted("COUNTIFS", pairs),
  ),
  ofOneCondition("SUMIF", sum),
  ofOneCondition("AVERAGEIF", average),
  ofConditions("SUMIFS", sum),
  ofConditions("AVERAGEIFS", average),
  ofConditions("MAXIFS", largest),
  ofConditions("MINIFS", smallest),
];
