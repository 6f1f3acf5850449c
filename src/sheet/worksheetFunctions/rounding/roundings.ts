import type { CellError } from "../../../call/cell.js";
import type { Decimal } from "../../values/decimal.js";
import { cutDecimal, decimalOf, numberOfDecimal, roundedDecimal } from "../../values/decimal.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { number, omittable, optional, whole } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

const up = (next: string, following: string) => /[1-9]/.test(next) || /[1-9]/.test(following);

function toPlaces(value: number, places: number, cut: (decimal: Decimal, places: number) => Decimal): number {
  // A double has no digits outside these places.
  const within = Math.min(Math.max(places, -310), 330);
  return numberOfDecimal(cut(decimalOf(value), within));
}

const nearest = (value: number, places: number) => toPlaces(value, places, roundedDecimal);
const awayFromZero = (value: number, places: number) =>
  toPlaces(value, places, (decimal, digits) => cutDecimal(decimal, digits, up));
const towardsZero = (value: number, places: number) =>
  toPlaces(value, places, (decimal, digits) => cutDecimal(decimal, digits, () => false));

/** How many steps fit, to the nearest below or above, free of the noise of a division: 0.3 holds three steps of 0.1. */
function steps(value: number, step: number, round: (ratio: number) => number): number {
  const ratio = value / step;
  const near = Math.round(ratio);
  return Math.abs(ratio - near) <= 4 * Number.EPSILON * Math.abs(near) ? near : round(ratio);
}

/** A multiple of a step as it would be typed: 3 steps of 0.1 are 0.3. */
function multiple(count: number, step: number): number {
  const { digits, exponent } = decimalOf(step);
  return nearest(count * step, Math.max(digits.length - exponent, 0));
}

const sameSign = (name: string, value: number, step: number) =>
  value * step < 0
    ? outside(
        `${name}: significance`,
        step,
        "of the other sign than the number",
        "a significance of the same sign is needed",
      )
    : undefined;

function toMultiple(name: string, direction: (ratio: number) => number): WorksheetFunction {
  const parameters = [
    number("number"),
    omittable(number("significance"), Number.NaN),
    omittable(number("mode"), 0),
  ] as const;
  return define(name, parameters, (value, significance, mode) => {
    const step = Number.isNaN(significance) ? (value < 0 ? -1 : 1) : significance;
    if (value === 0 || step === 0) {
      return 0;
    }
    const size = Math.abs(step);
    const signed = mode === 0 ? value : Math.abs(value);
    const count = steps(signed, size, direction);
    return sameSign(name, value, step) ?? multiple(count, size) * (mode !== 0 && value < 0 ? -1 : 1);
  });
}

/** The forms that take the size of the significance and leave its sign aside. */
function toMultipleOfSize(name: string, direction: (ratio: number) => number, modes: boolean): WorksheetFunction {
  const compute = (value: number, significance: number, mode = 0) => {
    const size = Math.abs(significance);
    if (size === 0) {
      return 0;
    }
    const mirrored = mode !== 0 && value < 0;
    const count = steps(mirrored ? -value : value, size, direction);
    return multiple(count, size) * (mirrored ? -1 : 1);
  };
  const common = [number("number"), optional(number("significance"), 1)] as const;
  return modes
    ? define(name, [...common, optional(number("mode"), 0)] as const, compute)
    : define(name, common, (value, significance) => compute(value, significance));
}

/** Section 6.17.4: of two multiples that are equally near the greater one. */
const mround = define("MROUND", [number("number"), number("multiple")] as const, (value, step) => {
  const size = Math.abs(step);
  return size === 0
    ? 0
    : multiple(
        steps(value, size, (ratio) => Math.floor(ratio + 0.5)),
        size,
      );
});

const toParity = (name: string, odd: 0 | 1): WorksheetFunction =>
  define(name, [number("number")] as const, (value) => {
    const size = Math.ceil(Math.abs(value));
    const fitting = size % 2 === odd ? size : size + 1;
    return value < 0 ? -fitting : fitting;
  });

const digits = optional(whole("digits"), 0);

/** Section 6.17, with EVEN (6.16.30) and ODD (6.16.44). */
export const roundings: readonly WorksheetFunction[] = [
  define("ROUND", [number("number"), digits] as const, nearest),
  define("ROUNDUP", [number("number"), digits] as const, awayFromZero),
  define("ROUNDDOWN", [number("number"), digits] as const, towardsZero),
  define("TRUNC", [number("number"), digits] as const, towardsZero),
  define("INT", [number("number")] as const, Math.floor),
  mround,
  toMultiple("CEILING", Math.ceil),
  toMultiple("FLOOR", Math.floor),
  toMultipleOfSize("CEILING.MATH", Math.ceil, true),
  toMultipleOfSize("FLOOR.MATH", Math.floor, true),
  toMultipleOfSize("CEILING.PRECISE", Math.ceil, false),
  toMultipleOfSize("ISO.CEILING", Math.ceil, false),
  toMultipleOfSize("FLOOR.PRECISE", Math.floor, false),
  toParity("EVEN", 0),
  toParity("ODD", 1),
  define("QUOTIENT", [number("dividend"), number("divisor")] as const, (dividend, divisor) =>
    divisor === 0 ? zeroDivisor("QUOTIENT") : Math.trunc(dividend / divisor) + 0,
  ),
  define("MOD", [number("dividend"), number("divisor")] as const, (dividend, divisor) =>
    divisor === 0 ? zeroDivisor("MOD") : remainder(dividend, divisor),
  ),
];

/** The remainder with the sign of the divisor, exact (section 6.16.42). */
function remainder(dividend: number, divisor: number): number {
  const rest = dividend % divisor;
  return rest !== 0 && rest < 0 !== divisor < 0 ? rest + divisor : rest + 0;
}

function zeroDivisor(name: string): CellError {
  return outside(`${name}: divisor`, 0, "zero or blank", "a number other than 0 is needed, for example 2", "#DIV/0!");
}
