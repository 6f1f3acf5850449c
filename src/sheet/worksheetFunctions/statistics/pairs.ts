import { CellError } from "../../../call/cell.js";
import { tooFew } from "../aggregates/aggregate.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { matrix, number } from "../define/parameters.js";
import { pairsOf } from "../gather/pairsOf.js";
import { mean, productDeviations, squaredDeviations, sumOf } from "../numerics/sum.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

type OfPairs = (left: Float64Array, right: Float64Array, name: string) => number | CellError;

const ofPairs = (name: string, inputs: readonly [string, string], least: number, compute: OfPairs) =>
  define(name, [matrix(inputs[0]), matrix(inputs[1])] as const, (left, right) => {
    const pairs = pairsOf(left, right, name);
    if (pairs instanceof CellError) {
      return pairs;
    }
    return pairs.left.length < least ? tooFew(name, pairs.left.length, least) : compute(pairs.left, pairs.right, name);
  });

const at = (values: Float64Array, index: number) => values[index] as number;

const noSpread = (name: string, of: string) =>
  outside(`${name}: spread of ${of}`, 0, "zero", "numbers that differ are needed", "#DIV/0!");

const correlation: OfPairs = (left, right, name) => {
  const spread = geometric(squaredDeviations(left), squaredDeviations(right));
  return spread === 0
    ? noSpread(name, "one of the ranges")
    : Math.max(-1, Math.min(1, productDeviations(left, right) / spread));
};

/** Root of a product, by roots of its factors where the product is beyond a double. */
function geometric(a: number, b: number): number {
  const product = a * b;
  return product > 1e-290 && product < 1e290 ? Math.sqrt(product) : Math.sqrt(a) * Math.sqrt(b);
}

interface Line {
  readonly slope: number;
  readonly intercept: number;
}

/** The straight line of least squares, y first as worksheets have it. */
function lineThrough(y: Float64Array, x: Float64Array, name: string): Line | CellError {
  const spread = squaredDeviations(x);
  if (spread === 0) {
    return noSpread(name, "the known x");
  }
  const slope = productDeviations(y, x) / spread;
  return { slope, intercept: mean(y) - slope * mean(x) };
}

const ofLine =
  (pick: (line: Line) => number): OfPairs =>
  (y, x, name) => {
    const line = lineThrough(y, x, name);
    return line instanceof CellError ? line : pick(line);
  };

const standardError: OfPairs = (y, x, name) => {
  const line = lineThrough(y, x, name);
  if (line instanceof CellError) {
    return line;
  }
  // Residuals themselves, not a difference of large sums: a good fit keeps its digits.
  const squares = sumOf(y.length, (index) => (at(y, index) - (line.intercept + line.slope * at(x, index))) ** 2);
  return Math.sqrt(squares / (y.length - 2));
};

const forecast = (name: string) =>
  define(name, [number("x"), matrix("known y"), matrix("known x")] as const, (x, knownY, knownX) => {
    const pairs = pairsOf(knownY, knownX, name);
    if (pairs instanceof CellError) {
      return pairs;
    }
    const line = pairs.left.length < 1 ? tooFew(name, 0, 1) : lineThrough(pairs.left, pairs.right, name);
    return line instanceof CellError ? line : line.intercept + line.slope * x;
  });

const ranges = ["first range", "second range"] as const;
const known = ["known y", "known x"] as const;

const sumOfPairs = (name: string, term: (a: number, b: number) => number) =>
  ofPairs(name, ranges, 1, (left, right) => sumOf(left.length, (index) => term(at(left, index), at(right, index))));

const squareDifference = (a: number, b: number) => (a - b) * (a + b);

/** Statistics of pairs: sections 6.16.66 to 6.16.68, 6.18.17, 6.18.18, 6.18.28, 6.18.38, 6.18.56, 6.18.66, 6.18.69, 6.18.76. */
export const pairStatistics: readonly WorksheetFunction[] = [
  ofPairs("CORREL", ranges, 2, correlation),
  ofPairs("PEARSON", ranges, 2, correlation),
  ofPairs("RSQ", known, 2, (y, x, name) => {
    const r = correlation(y, x, name);
    return r instanceof CellError ? r : r * r;
  }),
  ofPairs("COVAR", ranges, 1, (left, right) => productDeviations(left, right) / left.length),
  ofPairs("COVARIANCE.P", ranges, 1, (left, right) => productDeviations(left, right) / left.length),
  ofPairs("COVARIANCE.S", ranges, 2, (left, right) => productDeviations(left, right) / (left.length - 1)),
  ofPairs(
    "SLOPE",
    known,
    2,
    ofLine((line) => line.slope),
  ),
  ofPairs(
    "INTERCEPT",
    known,
    2,
    ofLine((line) => line.intercept),
  ),
  ofPairs("STEYX", known, 3, standardError),
  forecast("FORECAST"),
  forecast("FORECAST.LINEAR"),
  sumOfPairs("SUMXMY2", (a, b) => (a - b) ** 2),
  sumOfPairs("SUMX2MY2", squareDifference),
  sumOfPairs("SUMX2PY2", (a, b) => a * a + b * b),
];
