import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import { power } from "../../values/power.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { number, optional, value } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

interface Domain {
  readonly holds: (x: number) => boolean;
  /** What an input outside is. */
  readonly because: string;
  readonly needed: string;
  readonly code?: "#DIV/0!";
}

const unitInterval: Domain = {
  holds: (x) => x >= -1 && x <= 1,
  because: "outside -1 to 1",
  needed: "a number from -1 to 1 is needed, for example 0.5",
};
const positive: Domain = {
  holds: (x) => x > 0,
  because: "not above 0",
  needed: "a number above 0 is needed, for example 10",
};
const notNegative: Domain = {
  holds: (x) => x >= 0,
  because: "below 0",
  needed: "a number of 0 or more is needed, for example 4",
};
const notZero: Domain = {
  holds: (x) => x !== 0,
  because: "zero or blank",
  needed: "a number other than 0 is needed, for example 1",
  code: "#DIV/0!",
};
const atLeastOne: Domain = {
  holds: (x) => x >= 1,
  because: "below 1",
  needed: "a number of 1 or more is needed, for example 2",
};
const beyondOne: Domain = {
  holds: (x) => Math.abs(x) > 1,
  because: "not beyond -1 or 1",
  needed: "a number above 1 or below -1 is needed, for example 2",
};
const withinOne: Domain = {
  holds: (x) => Math.abs(x) < 1,
  because: "not between -1 and 1",
  needed: "a number between -1 and 1 is needed, for example 0.5",
};

const arcCotangent = (x: number) => Math.PI / 2 - Math.atan(x);

/** Name, function, domain where it is not all numbers (sections 6.16.2 to 6.16.70). */
const rows: readonly (readonly [string, (x: number) => number, Domain?])[] = [
  ["ABS", Math.abs],
  ["ACOS", Math.acos, unitInterval],
  ["ACOSH", Math.acosh, atLeastOne],
  // Beyond 1 the difference from pi/2 would lose its digits.
  ["ACOT", (x) => (x > 1 ? Math.atan(1 / x) : arcCotangent(x))],
  ["ACOTH", (x) => Math.atanh(1 / x), beyondOne],
  ["ASIN", Math.asin, unitInterval],
  ["ASINH", Math.asinh],
  ["ATAN", Math.atan],
  ["ATANH", Math.atanh, withinOne],
  ["COS", Math.cos],
  ["COSH", Math.cosh],
  ["COT", (x) => 1 / Math.tan(x), notZero],
  ["COTH", (x) => 1 / Math.tanh(x), notZero],
  ["CSC", (x) => 1 / Math.sin(x), notZero],
  ["CSCH", (x) => 1 / Math.sinh(x), notZero],
  ["DEGREES", (x) => (x / Math.PI) * 180],
  ["EXP", Math.exp],
  ["LN", Math.log, positive],
  ["LOG10", Math.log10, positive],
  ["RADIANS", (x) => (x / 180) * Math.PI],
  ["SEC", (x) => 1 / Math.cos(x)],
  ["SECH", (x) => 1 / Math.cosh(x)],
  ["SIGN", Math.sign],
  ["SIN", Math.sin],
  ["SINH", Math.sinh],
  ["SQRT", Math.sqrt, notNegative],
  ["SQRTPI", (x) => Math.sqrt(x * Math.PI), notNegative],
  ["TAN", Math.tan],
  ["TANH", Math.tanh],
];

const unary = rows.map(([name, compute, domain]) =>
  define(name, [number("number")] as const, (x): Cell => {
    if (domain && !domain.holds(x)) {
      return outside(`${name}: number`, x, domain.because, domain.needed, domain.code);
    }
    return compute(x);
  }),
);

const logarithm = define("LOG", [number("number"), optional(number("base"), 10)] as const, (x, base) => {
  if (x <= 0) {
    return outside("LOG: number", x, positive.because, positive.needed);
  }
  if (base <= 0) {
    return outside("LOG: base", base, positive.because, positive.needed);
  }
  if (base === 1) {
    return outside(
      "LOG: base",
      base,
      "a base whose powers are all 1",
      "another base is needed, for example 10",
      "#DIV/0!",
    );
  }
  return base === 10 ? Math.log10(x) : base === 2 ? Math.log2(x) : Math.log(x) / Math.log(base);
});

const arcTangentOfPoint = define("ATAN2", [number("x"), number("y")] as const, (x, y) =>
  x === 0 && y === 0
    ? new CellError(
        "#DIV/0!",
        "ATAN2: x and y are zero",
        "ATAN2: x and y are both 0 or blank, a point without direction; another point is needed, for example 1, 0",
      )
    : Math.atan2(y, x),
);

/** Elementary functions of one or two numbers. */
export const elementary: readonly WorksheetFunction[] = [
  ...unary,
  logarithm,
  arcTangentOfPoint,
  define("POWER", [number("base"), number("exponent")] as const, (base, exponent) => power(base, exponent, "POWER")),
  define("PI", [] as const, () => Math.PI),
  define("DELTA", [number("number"), optional(number("other number"), 0)] as const, (x, y) => (x === y ? 1 : 0)),
  define("GESTEP", [number("number"), optional(number("step"), 0)] as const, (x, step) => (x >= step ? 1 : 0)),
  define("N", [value("value")] as const, (x) => (typeof x === "number" ? x : x === true ? 1 : 0)),
];
