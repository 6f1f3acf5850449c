import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import type { Operand } from "../../values/operand.js";
import { isMatrix } from "../../values/operand.js";
import { cellsByRow } from "../arrays/shapes.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import type { Parameter } from "../define/parameters.js";
import { anything, number, optional, rest, text } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import type { Complex } from "./complexNumber.js";
import { complexFrom, complexText } from "./complexNumber.js";

const complex = (name: string): Parameter<Complex> => ({
  name,
  whole: false,
  read: (operand, what) => complexFrom(isMatrix(operand) ? operand.at(0, 0) : operand, what),
});

type Value = Pick<Complex, "re" | "im">;

const times = (a: Value, b: Value): Value => ({ re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re });
const argument = (z: Value) => Math.atan2(z.im, z.re);
const polar = (radius: number, angle: number): Value => ({
  re: radius * Math.cos(angle),
  im: radius * Math.sin(angle),
});
const exponential = (z: Value) => polar(Math.exp(z.re), z.im);
const logarithm = (z: Value): Value => ({ re: Math.log(Math.hypot(z.re, z.im)), im: argument(z) });
const scaled = (z: Value, factor: number): Value => ({ re: z.re * factor, im: z.im * factor });

/** Smith's division, which does not overflow on the way (Smith 1962, Communications of the ACM 5, 435). */
function over(a: Value, b: Value): Value {
  if (Math.abs(b.re) >= Math.abs(b.im)) {
    const ratio = b.im / b.re;
    const divisor = b.re + b.im * ratio;
    return { re: (a.re + a.im * ratio) / divisor, im: (a.im - a.re * ratio) / divisor };
  }
  const ratio = b.re / b.im;
  const divisor = b.re * ratio + b.im;
  return { re: (a.re * ratio + a.im) / divisor, im: (a.im * ratio - a.re) / divisor };
}

const one: Value = { re: 1, im: 0 };
const sine = (z: Value): Value => ({ re: Math.sin(z.re) * Math.cosh(z.im), im: Math.cos(z.re) * Math.sinh(z.im) });
const cosine = (z: Value): Value => ({ re: Math.cos(z.re) * Math.cosh(z.im), im: -Math.sin(z.re) * Math.sinh(z.im) });
const hyperbolicSine = (z: Value): Value => ({
  re: Math.sinh(z.re) * Math.cos(z.im),
  im: Math.cosh(z.re) * Math.sin(z.im),
});
const hyperbolicCosine = (z: Value): Value => ({
  re: Math.cosh(z.re) * Math.cos(z.im),
  im: Math.sinh(z.re) * Math.sin(z.im),
});

/** The root with the real part of 0 or more, without cancellation. */
function root(z: Value): Value {
  const radius = Math.hypot(z.re, z.im);
  const re = Math.sqrt((radius + Math.abs(z.re)) / 2);
  if (re === 0) {
    return { re: 0, im: 0 };
  }
  const other = Math.abs(z.im) / (2 * re);
  const sign = z.im < 0 ? -1 : 1;
  return z.re >= 0 ? { re, im: sign * other } : { re: other, im: sign * re };
}

const isZero = (z: Value) => z.re === 0 && z.im === 0;
const zeroInput = (name: string) =>
  outside(`${name}: number`, 0, "zero", 'a complex number other than 0 is needed, for example "3+4i"');

const toNumber = (name: string, compute: (z: Value) => number) => define(name, [complex("number")] as const, compute);

const toComplex = (name: string, compute: (z: Value) => Value, notAtZero = false) =>
  define(
    name,
    [complex("number")] as const,
    (z): Cell => (notAtZero && isZero(z) ? zeroInput(name) : written(compute(z), z)),
  );

const written = (value: Value, ...from: readonly Complex[]) =>
  complexText({ ...value, unit: from.find((each) => each.unit)?.unit });

const ofTwo = (name: string, compute: (a: Value, b: Value) => Value, divides = false) =>
  define(
    name,
    [complex("number"), complex("other number")] as const,
    (a, b): Cell => (divides && isZero(b) ? zeroInput(name) : written(compute(a, b), a, b)),
  );

/** All numbers of the arguments; blanks in rectangles are left out. */
const ofMany = (name: string, start: Value, combine: (a: Value, b: Value) => Value) =>
  define(name, [rest(anything("number"))] as const, (given: readonly { operand: Operand }[]): Cell => {
    const all: Complex[] = [];
    for (const cell of given.flatMap(({ operand }) =>
      isMatrix(operand) ? cellsByRow(operand).filter((each) => each !== null) : [operand],
    )) {
      const z = complexFrom(cell, `${name}: number`);
      if (z instanceof CellError) {
        return z;
      }
      all.push(z);
    }
    return written(all.reduce<Value>(combine, start), ...all);
  });

const power = define("IMPOWER", [complex("number"), number("exponent")] as const, (z, exponent): Cell => {
  if (isZero(z)) {
    return exponent > 0 ? "0" : zeroInput("IMPOWER");
  }
  // Small whole powers by multiplication are exact where the factors are.
  const isSmall = Number.isInteger(exponent) && Math.abs(exponent) <= 64;
  const product = Array.from({ length: isSmall ? Math.abs(exponent) : 0 }).reduce<Value>(
    (total) => times(total, z),
    one,
  );
  const result = isSmall ? (exponent < 0 ? over(one, product) : product) : exponential(scaled(logarithm(z), exponent));
  return written(result, z);
});

const compose = define(
  "COMPLEX",
  [number("real part"), number("imaginary part"), optional(text("unit"), "i")] as const,
  (re, im, unit): Cell =>
    unit === "i" || unit === "j"
      ? complexText({ re, im, unit })
      : outside("COMPLEX: unit", unit, "neither i nor j", "i or j is needed", "#VALUE!"),
);

/** Section 6.8. */
export const complexes: readonly WorksheetFunction[] = [
  compose,
  toNumber("IMABS", (z) => Math.hypot(z.re, z.im)),
  toNumber("IMREAL", (z) => z.re),
  toNumber("IMAGINARY", (z) => z.im),
  define("IMARGUMENT", [complex("number")] as const, (z): Cell => (isZero(z) ? zeroInput("IMARGUMENT") : argument(z))),
  toComplex("IMCONJUGATE", (z) => ({ re: z.re, im: -z.im })),
  toComplex("IMEXP", exponential),
  toComplex("IMLN", logarithm, true),
  toComplex("IMLOG10", (z) => scaled(logarithm(z), Math.LOG10E), true),
  toComplex("IMLOG2", (z) => scaled(logarithm(z), Math.LOG2E), true),
  toComplex("IMSQRT", root),
  toComplex("IMSIN", sine),
  toComplex("IMCOS", cosine),
  toComplex("IMTAN", (z) => over(sine(z), cosine(z))),
  toComplex("IMCOT", (z) => over(cosine(z), sine(z)), true),
  toComplex("IMSEC", (z) => over(one, cosine(z))),
  toComplex("IMCSC", (z) => over(one, sine(z)), true),
  toComplex("IMSINH", hyperbolicSine),
  toComplex("IMCOSH", hyperbolicCosine),
  toComplex("IMSECH", (z) => over(one, hyperbolicCosine(z))),
  toComplex("IMCSCH", (z) => over(one, hyperbolicSine(z)), true),
  power,
  ofTwo("IMDIV", over, true),
  ofTwo("IMSUB", (a, b) => ({ re: a.re - b.re, im: a.im - b.im })),
  ofMany("IMSUM", { re: 0, im: 0 }, (a, b) => ({ re: a.re + b.re, im: a.im + b.im })),
  ofMany("IMPRODUCT", one, times),
];
