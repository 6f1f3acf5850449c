import type { CellError } from "../../../call/cell.js";
import { outside } from "../define/outside.js";
import { median } from "../numerics/order.js";
import { mean, powerDeviations, squaredDeviations, sum, sumOf } from "../numerics/sum.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import { aggregate, tooFew } from "./aggregate.js";

type Summary = (numbers: Float64Array, name: string) => number | CellError;

/** The summary, or an error where there are fewer numbers than it needs. */
export const ofAtLeast =
  (least: number, compute: Summary): Summary =>
  (numbers, name) =>
    numbers.length < least ? tooFew(name, numbers.length, least) : compute(numbers, name);

export function product(numbers: Float64Array): number {
  if (numbers.length === 0) {
    return 0;
  }
  // Mantissas and exponents apart: a large factor may come before a small one.
  let mantissa = 1;
  let exponent = 0;
  for (const each of numbers) {
    mantissa *= each;
    const size = Math.abs(mantissa);
    if (size !== 0 && (size > 1e150 || size < 1e-150)) {
      const shift = Math.floor(Math.log2(size));
      mantissa *= 2 ** -shift;
      exponent += shift;
    }
  }
  // In two steps: one power of two alone may be beyond a double.
  const first = Math.max(Math.min(exponent, 1000), -1000);
  return mantissa * 2 ** first * 2 ** Math.max(Math.min(exponent - first, 1000), -1074);
}

export function largest(numbers: Float64Array): number {
  return numbers.length === 0 ? 0 : numbers.reduce((most, each) => Math.max(each, most), Number.NEGATIVE_INFINITY);
}

export function smallest(numbers: Float64Array): number {
  return numbers.length === 0 ? 0 : numbers.reduce((least, each) => Math.min(each, least), Number.POSITIVE_INFINITY);
}

export const average = ofAtLeast(1, mean);
export const sampleVariance = ofAtLeast(2, (numbers) => squaredDeviations(numbers) / (numbers.length - 1));
export const populationVariance = ofAtLeast(1, (numbers) => squaredDeviations(numbers) / numbers.length);
export const sampleDeviation = ofAtLeast(2, (numbers) => Math.sqrt(squaredDeviations(numbers) / (numbers.length - 1)));
export const populationDeviation = ofAtLeast(1, (numbers) => Math.sqrt(squaredDeviations(numbers) / numbers.length));

const meanDeviation = ofAtLeast(1, (numbers) => {
  const centre = mean(numbers);
  return sumOf(numbers.length, (index) => Math.abs((numbers[index] as number) - centre)) / numbers.length;
});

const positiveOnly =
  (compute: (numbers: Float64Array) => number): Summary =>
  (numbers, name) => {
    const wrong = numbers.find((each) => each <= 0);
    return wrong === undefined
      ? compute(numbers)
      : outside(`${name}: number`, wrong, "not above 0", "numbers above 0 are needed, for example 2, 8");
  };

const geometricMean = ofAtLeast(
  1,
  positiveOnly((numbers) =>
    Math.exp(sumOf(numbers.length, (index) => Math.log(numbers[index] as number)) / numbers.length),
  ),
);
const harmonicMean = ofAtLeast(
  1,
  positiveOnly((numbers) => numbers.length / sumOf(numbers.length, (index) => 1 / (numbers[index] as number))),
);

const allEqual = (name: string) =>
  outside(`${name}: spread of the numbers`, 0, "zero", "numbers that differ are needed", "#DIV/0!");

const skewness = (sample: boolean) =>
  ofAtLeast(sample ? 3 : 1, (numbers, name) => {
    const n = numbers.length;
    const variance = squaredDeviations(numbers) / n;
    if (variance === 0) {
      return allEqual(name);
    }
    const population = powerDeviations(numbers, 3) / n / variance ** 1.5;
    return sample ? (population * Math.sqrt(n * (n - 1))) / (n - 2) : population;
  });

const kurtosis = ofAtLeast(4, (numbers, name) => {
  const n = numbers.length;
  const variance = squaredDeviations(numbers) / (n - 1);
  if (variance === 0) {
    return allEqual(name);
  }
  const fourth = powerDeviations(numbers, 4) / variance ** 2;
  return (fourth * n * (n + 1)) / ((n - 1) * (n - 2) * (n - 3)) - (3 * (n - 1) ** 2) / ((n - 2) * (n - 3));
});

/** Name and summary; sections 6.16.47, 6.16.61, 6.16.65 and 6.18. */
const plain: readonly (readonly [string, Summary])[] = [
  ["SUM", sum],
  ["SUMSQ", (numbers) => sumOf(numbers.length, (index) => (numbers[index] as number) ** 2)],
  ["PRODUCT", product],
  ["AVERAGE", average],
  ["MAX", largest],
  ["MIN", smallest],
  ["MEDIAN", (numbers, name) => (numbers.length === 0 ? tooFew(name, 0, 1, "#NUM!") : median(numbers))],
  ["VAR", sampleVariance],
  ["VAR.S", sampleVariance],
  ["VARP", populationVariance],
  ["VAR.P", populationVariance],
  ["STDEV", sampleDeviation],
  ["STDEV.S", sampleDeviation],
  ["STDEVP", populationDeviation],
  ["STDEV.P", populationDeviation],
  ["DEVSQ", (numbers, name) => (numbers.length === 0 ? tooFew(name, 0, 1) : squaredDeviations(numbers))],
  ["AVEDEV", meanDeviation],
  ["GEOMEAN", geometricMean],
  ["HARMEAN", harmonicMean],
  ["SKEW", skewness(true)],
  ["SKEW.P", skewness(false)],
  ["SKEWP", skewness(false)],
  ["KURT", kurtosis],
];

const countingText: readonly (readonly [string, Summary])[] = [
  ["AVERAGEA", average],
  ["MAXA", largest],
  ["MINA", smallest],
  ["VARA", sampleVariance],
  ["VARPA", populationVariance],
  ["STDEVA", sampleDeviation],
  ["STDEVPA", populationDeviation],
];

export const summaries: readonly WorksheetFunction[] = [
  ...plain.map(([name, compute]) => aggregate(name, compute)),
  ...countingText.map(([name, compute]) => aggregate(name, compute, "count")),
];
