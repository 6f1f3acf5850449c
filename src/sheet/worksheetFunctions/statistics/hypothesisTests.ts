import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import type { Matrix } from "../../values/operand.js";
import { tooFew } from "../aggregates/aggregate.js";
import { tableOf } from "../arrays/matrices.js";
import { define, notFinite } from "../define/define.js";
import { outside } from "../define/outside.js";
import { matrix, number, optional, whole } from "../define/parameters.js";
import { numbersOf } from "../gather/numbersOf.js";
import { pairsOf } from "../gather/pairsOf.js";
import { incompleteBeta } from "../numerics/incompleteBeta.js";
import { incompleteGamma } from "../numerics/incompleteGamma.js";
import { normalBelow } from "../numerics/normal.js";
import { mean, squaredDeviations, sumOf } from "../numerics/sum.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

interface Sample {
  readonly count: number;
  readonly mean: number;
  readonly variance: number;
}

function sampleOf(name: string, range: Matrix): Sample | CellError {
  const numbers = numbersOf([range], `${name}: range`);
  if (numbers instanceof CellError) {
    return numbers;
  }
  const count = numbers.length;
  if (count < 2) {
    return tooFew(name, count, 2);
  }
  const variance = squaredDeviations(numbers) / (count - 1);
  return Number.isFinite(variance) ? { count, mean: mean(numbers), variance } : notFinite(name);
}

const noSpread = (name: string) =>
  outside(`${name}: spread of the numbers`, 0, "zero", "numbers that differ are needed", "#DIV/0!");

const bothTails = (t: number, freedom: number) =>
  incompleteBeta(freedom / (freedom + t * t), (t * t) / (freedom + t * t), freedom / 2, 0.5).below;

/** Differences of pairs. */
function pairedT(left: Matrix, right: Matrix): { t: number; freedom: number } | CellError {
  const pairs = pairsOf(left, right, "T.TEST");
  if (pairs instanceof CellError) {
    return pairs;
  }
  const differences = pairs.left.map((each, index) => each - (pairs.right[index] as number));
  const count = differences.length;
  if (count < 2) {
    return tooFew("T.TEST", count, 2);
  }
  const spread = squaredDeviations(differences) / (count - 1);
  return spread === 0 ? noSpread("T.TEST") : { t: mean(differences) / Math.sqrt(spread / count), freedom: count - 1 };
}

/** Samples of equal variance (type 2), or of unequal (type 3, with the degrees of freedom of Welch and Satterthwaite). */
function unpairedT(left: Matrix, right: Matrix, equalVariance: boolean): { t: number; freedom: number } | CellError {
  const a = sampleOf("T.TEST", left);
  const b = sampleOf("T.TEST", right);
  if (a instanceof CellError || b instanceof CellError) {
    return a instanceof CellError ? a : (b as CellError);
  }
  const [va, vb] = [a.variance / a.count, b.variance / b.count];
  if (va + vb === 0) {
    return noSpread("T.TEST");
  }
  if (!equalVariance) {
    const freedom = (va + vb) ** 2 / (va ** 2 / (a.count - 1) + vb ** 2 / (b.count - 1));
    return { t: (a.mean - b.mean) / Math.sqrt(va + vb), freedom };
  }
  const freedom = a.count + b.count - 2;
  const pooled = (a.variance * (a.count - 1) + b.variance * (b.count - 1)) / freedom;
  return { t: (a.mean - b.mean) / Math.sqrt(pooled * (1 / a.count + 1 / b.count)), freedom };
}

const tTest = (name: string) =>
  define(
    name,
    [matrix("first range"), matrix("second range"), whole("tails"), whole("type")] as const,
    (left, right, tails, type): Cell => {
      if (tails !== 1 && tails !== 2) {
        return outside(`${name}: tails`, tails, "neither 1 nor 2", "1 or 2 is needed");
      }
      if (type < 1 || type > 3) {
        return outside(
          `${name}: type`,
          type,
          "outside 1 to 3",
          "1 for pairs, 2 for equal, 3 for unequal variances is needed",
        );
      }
      const found = type === 1 ? pairedT(left, right) : unpairedT(left, right, type === 2);
      return found instanceof CellError ? found : (bothTails(found.t, found.freedom) * tails) / 2;
    },
  );

const fTest = (name: string) =>
  define(name, [matrix("first range"), matrix("second range")] as const, (left, right): Cell => {
    const a = sampleOf(name, left);
    const b = sampleOf(name, right);
    if (a instanceof CellError || b instanceof CellError) {
      return a instanceof CellError ? a : (b as CellError);
    }
    if (a.variance === 0 || b.variance === 0) {
      return noSpread(name);
    }
    const weighted = (a.count - 1) * a.variance;
    const total = weighted + (b.count - 1) * b.variance;
    const { below, above } = incompleteBeta(
      weighted / total,
      (total - weighted) / total,
      (a.count - 1) / 2,
      (b.count - 1) / 2,
    );
    return 2 * Math.min(below, above);
  });

const zTest = (name: string) =>
  define(
    name,
    [matrix("range"), number("mean"), optional(number("standard deviation"), Number.NaN)] as const,
    (range, expected, deviation): Cell => {
      const sample = sampleOf(name, range);
      if (sample instanceof CellError) {
        return sample;
      }
      const sigma = Number.isNaN(deviation) ? Math.sqrt(sample.variance) : deviation;
      return sigma > 0
        ? normalBelow((-(sample.mean - expected) * Math.sqrt(sample.count)) / sigma)
        : outside(`${name}: standard deviation`, sigma, "not above 0", "a number above 0 is needed, for example 1.5");
    },
  );

const chiSquareTest = (name: string) =>
  define(name, [matrix("observed"), matrix("expected")] as const, (observed, expected): Cell => {
    const a = tableOf(observed, name);
    const b = tableOf(expected, name);
    if (a instanceof CellError || b instanceof CellError) {
      return a instanceof CellError ? a : (b as CellError);
    }
    const freedom = a.rows > 1 && a.columns > 1 ? (a.rows - 1) * (a.columns - 1) : a.values.length - 1;
    if (a.rows !== b.rows || a.columns !== b.columns || freedom < 1) {
      return new CellError(
        "#N/A",
        `${name}: ranges that do not fit`,
        `${name}: observed are ${a.rows} x ${a.columns}, expected ${b.rows} x ${b.columns} cells; ranges of one size with two cells or more are needed`,
      );
    }
    const zero = b.values.find((each) => each <= 0);
    if (zero !== undefined) {
      return outside(`${name}: expected`, zero, "not above 0", "numbers above 0 are needed", "#DIV/0!");
    }
    const square = sumOf(
      a.values.length,
      (index) => ((a.values[index] as number) - (b.values[index] as number)) ** 2 / (b.values[index] as number),
    );
    return incompleteGamma(freedom / 2, square / 2).above;
  });

/** Sections 6.18.15, 6.18.30, 6.18.81 and 6.18.87. */
export const hypothesisTests: readonly WorksheetFunction[] = [
  ...["T.TEST", "TTEST"].map(tTest),
  ...["F.TEST", "FTEST"].map(fTest),
  ...["Z.TEST", "ZTEST"].map(zTest),
  ...["CHISQ.TEST", "CHITEST", "LEGACY.CHITEST"].map(chiSquareTest),
];
