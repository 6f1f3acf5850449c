import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { number, optional } from "../define/parameters.js";
import { complementaryErrorFunction, errorFunction } from "../numerics/errorFunction.js";
import { gamma, logGamma } from "../numerics/gamma.js";
import { normalDensity } from "../numerics/normal.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

const logarithmOfGamma = (name: string) =>
  define(name, [number("number")] as const, (x) =>
    x > 0 ? logGamma(x) : outside(`${name}: number`, x, "not above 0", "a number above 0 is needed, for example 4.5"),
  );

const unary = (name: string, compute: (x: number) => number) => define(name, [number("number")] as const, compute);

/** Sections 6.16.27, 6.16.28, 6.16.34, 6.16.35, 6.18.33 and 6.18.61. */
export const special: readonly WorksheetFunction[] = [
  define("GAMMA", [number("number")] as const, (x) =>
    x <= 0 && Number.isInteger(x)
      ? outside(
          "GAMMA: number",
          x,
          "0 or a negative whole number, where the function has no value",
          "another number is needed, for example 4.5",
        )
      : gamma(x),
  ),
  logarithmOfGamma("GAMMALN"),
  logarithmOfGamma("GAMMALN.PRECISE"),
  define("ERF", [number("lower limit"), optional(number("upper limit"), Number.NaN)] as const, (lower, upper) =>
    Number.isNaN(upper) ? errorFunction(lower) : betweenLimits(lower, upper),
  ),
  unary("ERF.PRECISE", errorFunction),
  unary("ERFC", complementaryErrorFunction),
  unary("ERFC.PRECISE", complementaryErrorFunction),
  unary("GAUSS", (z) => errorFunction(z / Math.SQRT2) / 2),
  unary("PHI", normalDensity),
];

/** erf(upper) - erf(lower), from the tails where both lie on one side. */
function betweenLimits(lower: number, upper: number): number {
  if (lower > 0 && upper > 0) {
    return complementaryErrorFunction(lower) - complementaryErrorFunction(upper);
  }
  if (lower < 0 && upper < 0) {
    return complementaryErrorFunction(-upper) - complementaryErrorFunction(-lower);
  }
  return errorFunction(upper) - errorFunction(lower);
}
