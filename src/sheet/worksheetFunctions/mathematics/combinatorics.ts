import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { anything, rest, whole } from "../define/parameters.js";
import { numbersOf } from "../gather/numbersOf.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

const largestFactorial = 170;
/** The middle coefficient of 2 x 515 is the first above the largest double. */
const mostFactors = 1100;

/** n (n-1) ... (n-k+1) as an exact integer. */
function fallingFactorial(n: number, k: number, step = 1): bigint {
  let product = 1n;
  for (let index = 0; index < k; index++) {
    product *= BigInt(n - index * step);
  }
  return product;
}

/** The binomial coefficient, to the nearest double; Infinity beyond. */
export function binomial(n: number, k: number): number {
  const fewer = Math.min(k, n - k);
  if (fewer > mostFactors) {
    return Number.POSITIVE_INFINITY;
  }
  return Number(fallingFactorial(n, fewer) / fallingFactorial(fewer, fewer));
}

const needed = "a whole number of 0 or more is needed, for example 5";

function count(name: string, input: string, x: number): CellError | undefined {
  if (x < 0) {
    return outside(`${name}: ${input}`, x, "below 0", needed);
  }
  return x > Number.MAX_SAFE_INTEGER
    ? outside(`${name}: ${input}`, x, "beyond 9007199254740991, the largest exact integer", needed)
    : undefined;
}

function ofCounts(
  name: string,
  inputs: readonly [string, string],
  compute: (n: number, k: number) => Cell,
): WorksheetFunction {
  return define(name, [whole(inputs[0]), whole(inputs[1])] as const, (n, k) => {
    return count(name, inputs[0], n) ?? count(name, inputs[1], k) ?? compute(n, k);
  });
}

const tooMany = (name: string, n: number, k: number) =>
  outside(`${name}: number chosen`, k, `more than the ${n} there are`, `a number up to ${n} is needed`);

const factorial = (name: string, step: 1 | 2, most: number) =>
  define(name, [whole("number")] as const, (n) => {
    if (n > most) {
      return outside(
        `${name}: number`,
        n,
        `above ${most}, beyond which the result exceeds a double`,
        "a smaller number is needed, for example 5",
      );
    }
    return count(name, "number", n) ?? Number(fallingFactorial(n, Math.ceil(n / step), step));
  });

/** Numbers of an argument list as whole numbers of 0 or more. */
function counts(
  name: string,
  given: readonly { operand: Parameters<typeof numbersOf>[0][number] }[],
): number[] | CellError {
  const found = numbersOf(
    given.map((each) => each.operand),
    `${name}: number`,
  );
  if (found instanceof CellError) {
    return found;
  }
  const wholes = Array.from(found, Math.trunc);
  for (const each of wholes) {
    const problem = count(name, "number", each);
    if (problem) {
      return problem;
    }
  }
  return wholes;
}

function divisor(a: number, b: number): number {
  return b === 0 ? a : divisor(b, a % b);
}

const ofMany = (name: string, compute: (numbers: number[]) => number) =>
  define(name, [rest(anything("number"))] as const, (given) => {
    const numbers = counts(name, given);
    return numbers instanceof CellError ? numbers : compute(numbers);
  });

function leastMultiple(numbers: number[]): number {
  const all = numbers.reduce((multiple, each) => {
    const next = BigInt(each);
    return next === 0n || multiple === 0n ? 0n : (multiple * next) / BigInt(divisor(each, Number(multiple % next)));
  }, 1n);
  return Number(all);
}

function multinomial(numbers: number[]): number {
  let total = 0;
  let product = 1;
  for (const each of numbers) {
    total += each;
    product *= binomial(total, each);
  }
  return product;
}

/** Sections 6.16.16, 6.16.17, 6.16.32, 6.16.33, 6.16.36, 6.16.38, 6.16.43, 6.18.59 and 6.18.60. */
export const combinatorics: readonly WorksheetFunction[] = [
  factorial("FACT", 1, largestFactorial),
  factorial("FACTDOUBLE", 2, 300),
  ofCounts("COMBIN", ["number", "number chosen"], (n, k) => (k > n ? tooMany("COMBIN", n, k) : binomial(n, k))),
  ofCounts("COMBINA", ["number", "number chosen"], (n, k) =>
    n === 0 && k === 0 ? 1 : n === 0 ? 0 : binomial(n + k - 1, k),
  ),
  ofCounts("PERMUT", ["number", "number chosen"], (n, k) => {
    if (k > n) {
      return tooMany("PERMUT", n, k);
    }
    return k > mostFactors ? Number.POSITIVE_INFINITY : Number(fallingFactorial(n, k));
  }),
  ofCounts("PERMUTATIONA", ["number", "number chosen"], (n, k) => (k === 0 ? 1 : n ** k)),
  ofMany("GCD", (numbers) => numbers.reduce(divisor, 0)),
  ofMany("LCM", leastMultiple),
  ofMany("MULTINOMIAL", multinomial),
];
