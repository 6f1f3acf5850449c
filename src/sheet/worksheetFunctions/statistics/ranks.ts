import { CellError } from "../../../call/cell.js";
import type { Matrix } from "../../values/operand.js";
import { buildMatrix } from "../../values/operand.js";
import { aggregate, tooFew } from "../aggregates/aggregate.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { matrix, number, optional, whole } from "../define/parameters.js";
import { numbersOf } from "../gather/numbersOf.js";
import { atPosition, interpolated, sorted } from "../numerics/order.js";
import { mean } from "../numerics/sum.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

/** The numbers of a range in ascending order, or the error that stands in the way. */
function ascending(range: Matrix, name: string): Float64Array | CellError {
  const numbers = numbersOf([range], `${name}: range`);
  if (numbers instanceof CellError) {
    return numbers;
  }
  return numbers.length === 0 ? tooFew(name, 0, 1, "#NUM!") : sorted(numbers);
}

const ofSorted = (name: string, input: string, compute: (numbers: Float64Array, place: number) => number | CellError) =>
  define(name, [matrix("range"), number(input)] as const, (range, place) => {
    const numbers = ascending(range, name);
    return numbers instanceof CellError ? numbers : compute(numbers, place);
  });

const nth = (name: string, from: "largest" | "smallest") =>
  ofSorted(name, "place", (numbers, place) => {
    const index = Math.ceil(place);
    if (index < 1 || index > numbers.length) {
      return outside(
        `${name}: place`,
        place,
        `outside 1 to ${numbers.length}, the count of numbers`,
        "such a place is needed, for example 1",
      );
    }
    return numbers[from === "smallest" ? index - 1 : numbers.length - index] as number;
  });

const percentile = (name: string, ends: "with ends" | "without ends") =>
  ofSorted(name, "share", (numbers, share) => placed(name, numbers, share, ends));

function placed(
  name: string,
  numbers: Float64Array,
  share: number,
  ends: "with ends" | "without ends",
): number | CellError {
  if (ends === "with ends") {
    return share < 0 || share > 1
      ? outside(`${name}: share`, share, "outside 0 to 1", "a share from 0 to 1 is needed, for example 0.9")
      : interpolated(numbers, share);
  }
  const count = numbers.length;
  const position = share * (count + 1);
  return position < 1 || position > count
    ? outside(
        `${name}: share`,
        share,
        `outside what ${count} numbers can tell`,
        "a share nearer to 0.5 or more numbers are needed",
      )
    : atPosition(numbers, position - 1);
}

const quartile = (name: string, ends: "with ends" | "without ends") =>
  ofSorted(name, "quarter", (numbers, quarter) => {
    const which = Math.trunc(quarter);
    const [first, last] = ends === "with ends" ? [0, 4] : [1, 3];
    return which < first || which > last
      ? outside(
          `${name}: quarter`,
          quarter,
          `outside ${first} to ${last}`,
          `a whole number from ${first} to ${last} is needed, for example 2`,
        )
      : placed(name, numbers, which / 4, ends);
  });

/** How many of the numbers are below x, and how many equal it. */
function standing(numbers: Float64Array, x: number): { below: number; equal: number } {
  let below = 0;
  let equal = 0;
  for (const each of numbers) {
    below += each < x ? 1 : 0;
    equal += each === x ? 1 : 0;
  }
  return { below, equal };
}

const notThere = (name: string, x: number) =>
  outside(`${name}: number`, x, "not among the numbers of the range", "a number of the range is needed", "#N/A");

const rank = (name: string, ties: "first" | "average") =>
  define(name, [number("number"), matrix("range"), optional(number("order"), 0)] as const, (x, range, order) => {
    const numbers = numbersOf([range], `${name}: range`);
    if (numbers instanceof CellError) {
      return numbers;
    }
    const { below, equal } = standing(numbers, x);
    if (equal === 0) {
      return notThere(name, x);
    }
    const first = order === 0 ? numbers.length - below - equal + 1 : below + 1;
    return ties === "first" ? first : first + (equal - 1) / 2;
  });

const percentRank = (name: string, ends: "with ends" | "without ends") =>
  define(name, [matrix("range"), number("number"), optional(whole("digits"), 3)] as const, (range, x, digits) => {
    const numbers = ascending(range, name);
    if (numbers instanceof CellError) {
      return numbers;
    }
    const count = numbers.length;
    if (x < (numbers[0] as number) || x > (numbers[count - 1] as number)) {
      return outside(
        `${name}: number`,
        x,
        "outside the range of the numbers",
        "a number between the smallest and the largest is needed",
        "#N/A",
      );
    }
    if (digits < 1) {
      return outside(`${name}: digits`, digits, "below 1", "a whole number of 1 or more is needed, for example 3");
    }
    const position = positionOf(numbers, x);
    const share = ends === "with ends" ? (count === 1 ? 1 : position / (count - 1)) : (position + 1) / (count + 1);
    const scale = 10 ** digits;
    return Math.floor(share * scale * (1 + Number.EPSILON)) / scale;
  });

/** The position of x among sorted numbers, counted from 0, linear between neighbours. */
function positionOf(numbers: Float64Array, x: number): number {
  const { below, equal } = standing(numbers, x);
  if (equal > 0) {
    return below;
  }
  const lower = numbers[below - 1] as number;
  const upper = numbers[below] as number;
  return below - 1 + (x - lower) / (upper - lower);
}

/** The number that comes most often, the first of them in the order of the cells. */
function modes(numbers: Float64Array): number[] {
  const counts = new Map<number, number>();
  let most = 1;
  for (const each of numbers) {
    const count = (counts.get(each) ?? 0) + 1;
    counts.set(each, count);
    most = Math.max(most, count);
  }
  return most === 1 ? [] : [...counts].filter(([, count]) => count === most).map(([each]) => each);
}

const noMode = (name: string) =>
  new CellError(
    "#N/A",
    `${name}: no number comes twice`,
    `${name}: no number comes more than once; numbers that repeat are needed, for example 1, 2, 2`,
  );

const mode = (name: string) => aggregate(name, (numbers) => modes(numbers)[0] ?? noMode(name));

const trimmedMean = define("TRIMMEAN", [matrix("range"), number("share")] as const, (range, share) => {
  const numbers = ascending(range, "TRIMMEAN");
  if (numbers instanceof CellError) {
    return numbers;
  }
  if (share < 0 || share >= 1) {
    return outside(
      "TRIMMEAN: share",
      share,
      "outside 0 to 1",
      "a share from 0 up to but not including 1 is needed, for example 0.2",
    );
  }
  const each = Math.floor((numbers.length * share) / 2);
  return mean(numbers.subarray(each, numbers.length - each));
});

/** Sections 6.18.40, 6.18.50, 6.18.57, 6.18.58, 6.18.64, 6.18.65, 6.18.70 and 6.18.80. */
export const ranks: readonly WorksheetFunction[] = [
  nth("LARGE", "largest"),
  nth("SMALL", "smallest"),
  percentile("PERCENTILE", "with ends"),
  percentile("PERCENTILE.INC", "with ends"),
  percentile("PERCENTILE.EXC", "without ends"),
  quartile("QUARTILE", "with ends"),
  quartile("QUARTILE.INC", "with ends"),
  quartile("QUARTILE.EXC", "without ends"),
  rank("RANK", "first"),
  rank("RANK.EQ", "first"),
  rank("RANK.AVG", "average"),
  percentRank("PERCENTRANK", "with ends"),
  percentRank("PERCENTRANK.INC", "with ends"),
  percentRank("PERCENTRANK.EXC", "without ends"),
  mode("MODE"),
  mode("MODE.SNGL"),
  aggregate("MODE.MULT", (numbers, name) => {
    const found = modes(numbers);
    return found.length === 0 ? noMode(name) : buildMatrix(found.length, 1, (row) => found[row] as number);
  }),
  trimmedMean,
];
