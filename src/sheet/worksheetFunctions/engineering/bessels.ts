import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { number, whole } from "../define/parameters.js";
import { besselI, besselJ, besselK, besselY } from "../numerics/bessel.js";
import type { WorksheetFunction } from "../worksheetFunction.js";

/** The recurrences take as many steps as the larger of x and the order. */
const largest = 100_000;

const bessel = (name: string, compute: (x: number, n: number) => number, positiveOnly: boolean) =>
  define(name, [number("x"), whole("order")] as const, (x, n) => {
    if (n < 0 || n > largest) {
      return outside(`${name}: order`, n, `outside 0 to ${largest}`, "a whole number within is needed, for example 1");
    }
    if ((positiveOnly && x <= 0) || Math.abs(x) > largest) {
      return outside(
        `${name}: x`,
        x,
        positiveOnly ? `not above 0 or beyond ${largest}` : `beyond ${largest}`,
        "a number within is needed, for example 1.5",
      );
    }
    return compute(x, n);
  });

/** Sections 6.16.12 to 6.16.15. */
export const bessels: readonly WorksheetFunction[] = [
  bessel("BESSELI", besselI, false),
  bessel("BESSELJ", besselJ, false),
  bessel("BESSELK", besselK, true),
  bessel("BESSELY", besselY, true),
];
