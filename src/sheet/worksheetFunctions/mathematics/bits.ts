import type { CellError } from "../../../call/cell.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { number } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

const firstBeyond = 2 ** 48;

function bitPattern(name: string, input: string, x: number): CellError | undefined {
  return Number.isInteger(x) && x >= 0 && x < firstBeyond
    ? undefined
    : outside(
        `${name}: ${input}`,
        x,
        "not a whole number from 0 to 281474976710655",
        "such a number is needed, for example 5",
      );
}

const ofBits = (name: string, combine: (a: bigint, b: bigint) => bigint) =>
  define(name, [number("number"), number("other number")] as const, (a, b) => {
    return (
      bitPattern(name, "number", a) ?? bitPattern(name, "other number", b) ?? Number(combine(BigInt(a), BigInt(b)))
    );
  });

const shift = (name: string, direction: 1 | -1) =>
  define(name, [number("number"), number("shift")] as const, (x, by) => {
    const problem = bitPattern(name, "number", x);
    if (problem) {
      return problem;
    }
    if (Math.abs(by) > 53) {
      return outside(`${name}: shift`, by, "beyond 53 places", "a shift from -53 to 53 is needed, for example 2");
    }
    const result = Math.floor(x * 2 ** (direction * Math.trunc(by)));
    return result < firstBeyond
      ? result
      : outside(`${name}: shift`, by, "so far that the result exceeds 281474976710655", "a smaller shift is needed");
  });

/** Section 6.6. */
export const bits: readonly WorksheetFunction[] = [
  ofBits("BITAND", (a, b) => a & b),
  ofBits("BITOR", (a, b) => a | b),
  ofBits("BITXOR", (a, b) => a ^ b),
  shift("BITLSHIFT", 1),
  shift("BITRSHIFT", -1),
];
