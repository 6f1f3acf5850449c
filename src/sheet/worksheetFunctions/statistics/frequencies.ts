import { CellError } from "../../../call/cell.js";
import type { Matrix } from "../../values/operand.js";
import { buildMatrix } from "../../values/operand.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { matrix, number, optional } from "../define/parameters.js";
import { numbersOf } from "../gather/numbersOf.js";
import { pairsOf } from "../gather/pairsOf.js";
import { sorted } from "../numerics/order.js";
import { sum, sumOf } from "../numerics/sum.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

/** Section 6.18.29: how many numbers lie up to each bound and above the one before, and above the last. */
const frequency = define("FREQUENCY", [matrix("data"), matrix("bounds")] as const, (data, bounds) => {
  const numbers = numbersOf([data], "FREQUENCY: data");
  const limits = numbersOf([bounds], "FREQUENCY: bounds");
  if (numbers instanceof CellError || limits instanceof CellError) {
    return numbers instanceof CellError ? numbers : (limits as CellError);
  }
  const ascending = sorted(numbers);
  const upTo = (limit: number) => countUpTo(ascending, limit);
  const inOrder = sorted(limits);
  const seen = new Set<number>();
  return buildMatrix(limits.length + 1, 1, (row) => {
    if (row === limits.length) {
      return ascending.length - (inOrder.length > 0 ? upTo(inOrder.at(-1) as number) : 0);
    }
    const limit = limits[row] as number;
    const place = inOrder.indexOf(limit);
    const repeated = seen.has(limit);
    seen.add(limit);
    return repeated ? 0 : upTo(limit) - (place > 0 ? upTo(inOrder[place - 1] as number) : 0);
  });
});

function countUpTo(ascending: Float64Array, limit: number): number {
  let low = 0;
  let high = ascending.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((ascending[middle] as number) <= limit) {
      low = middle + 1;
    } else {
      high = middle;
    }
  }
  return low;
}

/** Section 6.18.63. */
const probability = define(
  "PROB",
  [matrix("values"), matrix("chances"), number("lower"), optional(number("upper"), Number.NaN)] as const,
  (values, chances, lower, upper) => {
    const pairs = pairsOf(values, chances, "PROB");
    if (pairs instanceof CellError) {
      return pairs;
    }
    const { left, right } = pairs;
    const wrong = right.find((chance) => chance < 0 || chance > 1);
    const total = sum(right);
    if (wrong !== undefined) {
      return outside("PROB: chance", wrong, "outside 0 to 1", "chances from 0 to 1 are needed, for example 0.2");
    }
    if (Math.abs(total - 1) > 1e-7) {
      return outside("PROB: sum of chances", total, "not 1", "chances that add up to 1 are needed");
    }
    const most = Number.isNaN(upper) ? lower : upper;
    return sumOf(left.length, (index) =>
      (left[index] as number) >= lower && (left[index] as number) <= most ? (right[index] as number) : 0,
    );
  },
);

const seriesSum = define(
  "SERIESSUM",
  [number("x"), number("first power"), number("step"), matrix("coefficients")] as const,
  (x, first, step, range: Matrix) => {
    const coefficients = numbersOf([range], "SERIESSUM: coefficients");
    return coefficients instanceof CellError
      ? coefficients
      : sumOf(coefficients.length, (index) => (coefficients[index] as number) * x ** (first + index * step));
  },
);

export const frequencies: readonly WorksheetFunction[] = [frequency, probability, seriesSum];
