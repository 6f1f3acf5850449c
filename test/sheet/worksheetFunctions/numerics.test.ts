import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { besselI, besselJ, besselK, besselY } from "../../../src/sheet/worksheetFunctions/numerics/bessel.js";
import {
  complementaryErrorFunction,
  errorFunction,
} from "../../../src/sheet/worksheetFunctions/numerics/errorFunction.js";
import { gamma, logGamma } from "../../../src/sheet/worksheetFunctions/numerics/gamma.js";
import { incompleteBeta } from "../../../src/sheet/worksheetFunctions/numerics/incompleteBeta.js";
import { incompleteGamma } from "../../../src/sheet/worksheetFunctions/numerics/incompleteGamma.js";
import { normalQuantile } from "../../../src/sheet/worksheetFunctions/numerics/normal.js";
import { median } from "../../../src/sheet/worksheetFunctions/numerics/order.js";
import { quantile } from "../../../src/sheet/worksheetFunctions/numerics/quantile.js";
import { mean, squaredDeviations, sum } from "../../../src/sheet/worksheetFunctions/numerics/sum.js";

const functions: Readonly<Record<string, (...values: number[]) => number>> = {
  logGamma,
  gamma,
  gammaBelow: (a = 0, x = 0) => incompleteGamma(a, x).below,
  gammaAbove: (a = 0, x = 0) => incompleteGamma(a, x).above,
  betaBelow: (x = 0, a = 0, b = 0) => incompleteBeta(x, 1 - x, a, b).below,
  erf: errorFunction,
  erfc: complementaryErrorFunction,
  normalQuantile,
  besselI,
  besselJ,
  besselK,
  besselY,
} as Readonly<Record<string, (...values: number[]) => number>>;

describe("special functions", () => {
  const rows = readFileSync(new URL("numerics.txt", import.meta.url), "utf8")
    .split("\n")
    .filter((line) => line.includes(" | ") && !line.startsWith("#"))
    .map((line) => line.split(" | ") as [string, string, string, string]);

  it.each(rows)("%s(%s)", (name, values, expected, tolerance) => {
    const result = (functions[name] as (...given: number[]) => number)(...values.split(" ").map(Number));
    expect(Math.abs(result / Number(expected) - 1)).toBeLessThanOrEqual(Number(tolerance));
  });
});

/** The exact sum of doubles, as an integer count of the smallest double there is (2^-1074). */
function exactSum(values: readonly number[]): bigint {
  const view = new DataView(new ArrayBuffer(8));
  return values.reduce((total, value) => {
    view.setFloat64(0, Math.abs(value));
    const bits = view.getBigUint64(0);
    const exponent = bits >> 52n;
    const fraction = bits & 0xfffffffffffffn;
    const units = exponent === 0n ? fraction : (fraction | 0x10000000000000n) << (exponent - 1n);
    return value < 0 ? total - units : total + units;
  }, 0n);
}

describe("sums", () => {
  // Neumaier 1974: the error is about one rounding of the exact sum unless cancellation exceeds 1/eps.
  it("are the exact sum, rounded about once", () => {
    const values = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 200 });
    fc.assert(
      fc.property(values, (numbers) => {
        const size = numbers.reduce((total, each) => total + Math.abs(each), 0);
        const units = exactSum(numbers) - exactSum([sum(numbers)]);
        const missed = Number((units < 0n ? -units : units) >> 974n) * 2 ** -100;
        expect(missed).toBeLessThanOrEqual(2.3e-16 * Math.abs(sum(numbers)) + numbers.length ** 2 * 2.5e-32 * size);
      }),
    );
  });

  it("keep what a large number would swallow", () => {
    expect(sum([1, 1e100, 1, -1e100])).toBe(2); // Neumaier's own example
    expect(squaredDeviations([1e9 + 4, 1e9 + 7, 1e9 + 13, 1e9 + 16])).toBe(90); // hand: -6, -3, 3, 6
    expect(mean([1.7e308, 1.7e308])).toBe(1.7e308);
    expect(median([1.7e308, 1.7e308])).toBe(1.7e308);
  });
});

describe("quantiles", () => {
  it("are where the distribution has the chance", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.2, max: 200, noNaN: true }),
        fc.double({ min: 1e-6, max: 0.999999, noNaN: true }),
        (a, p) => {
          const x = quantile((at) => incompleteGamma(a, at), { below: p, above: 1 - p }, 0, Number.POSITIVE_INFINITY);
          expect(Math.abs(incompleteGamma(a, x).below - p)).toBeLessThanOrEqual(1e-13);
        },
      ),
    );
  });
});
