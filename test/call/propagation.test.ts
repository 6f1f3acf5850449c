import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Cell, CellError } from "../../src/call/cell.js";
import { call, functionNamed, type Given } from "./door.js";
import { type Light, lightLaws, orbitalLaws, type System } from "./laws.js";
import { logarithmic } from "./table.js";

/** Inputs, then headers where they belong: words in between are left out. */
function callOf(name: string, inputs: readonly Given[], headers: readonly string[], result?: string): Cell[][] {
  const between = functionNamed(name).mostArguments - 2 - inputs.length;
  return call(name, ...inputs, ...Array<undefined>(between).fill(undefined), headers.join("; "), result);
}

/** The result's uncertainty when one input alone has one. */
function sigmaFrom(name: string, inputs: readonly number[], index: number, sigma: number, headers: readonly string[]) {
  const given = inputs.map((value, at): Given => (at === index ? [[value, sigma]] : value));
  const [value, uncertainty] = callOf(name, given, headers)[0]! as number[];
  return { value: value!, uncertainty: uncertainty! };
}

const system: fc.Arbitrary<System> = fc.record({
  period: logarithmic(0.1, 1e6),
  star: logarithmic(1e-3, 100),
  ratio: fc.oneof(logarithmic(1e-9, 1), fc.constantFrom(1e-9, 1e-3, 1)),
  eccentricity: fc.oneof(
    fc.double({ min: 0, max: 0.99, noNaN: true }),
    fc.constantFrom(0, 1e-9, 1e-4, 1e-3, 0.01, 0.99, 0.9999),
  ),
  inclination: fc.oneof(
    fc.double({ min: 0.01, max: 3.13, noNaN: true }),
    fc.constantFrom(Math.PI / 2, Math.PI / 2 - 1e-6, 1.5, 0.01),
  ),
});
const light: fc.Arbitrary<Light> = fc.record({
  beta: fc.oneof(
    fc.tuple(logarithmic(1e-12, 0.99), fc.constantFrom(1, -1)).map(([size, sign]) => size * sign),
    fc.constantFrom(0, 0.5, -0.99),
  ),
  wavelength: logarithmic(230, 1690),
  resolvingPower: logarithmic(1e3, 1e6),
  sampling: logarithmic(1, 10),
});

/** Asked for, relative to the exact derivative. */
const relative = 1e-7;
/**
 * Near a circle and edge-on the law is flat: the derivative itself goes to 0 there and cannot be good to a fraction of
 * itself in differences of doubles. It is good to this fraction of the result, for an uncertainty of 1 (or 1 rad).
 */
const flat = 1e-11;

describe("uncertainty of the result, against exact logarithmic derivatives", () => {
  test.each(orbitalLaws)("$function", ({ function: name, headers, inputs, derivatives }) => {
    fc.assert(
      fc.property(system, (one) => {
        const values = inputs(one);
        derivatives(one).forEach((derivative, index) => {
          const isFlat = headers[index] === "1" || headers[index] === "rad";
          const sigma = 0.01 * (isFlat && name !== "SHIFTMASS" ? 1 : values[index]! || 1);
          const { value, uncertainty } = sigmaFrom(name, values, index, sigma, headers);
          const expected = Math.abs(derivative * sigma);
          const tolerance = relative * expected + (isFlat ? flat * sigma : 0);
          expect(Math.abs(uncertainty / Math.abs(value) - expected), `input ${index}`).toBeLessThanOrEqual(tolerance);
        });
      }),
      { numRuns: 150 },
    );
  });

  test.each(lightLaws)("$function", ({ function: name, headers, inputs, slopes }) => {
    fc.assert(
      fc.property(light, (one) => {
        const values = inputs(one);
        slopes(one).forEach((slope, index) => {
          const sigma = 0.01 * (Math.abs(values[index]!) || 1);
          const { uncertainty } = sigmaFrom(name, values, index, sigma, headers);
          const expected = Math.abs(slope * sigma);
          expect(Math.abs(uncertainty - expected), `input ${index}`).toBeLessThanOrEqual(relative * expected);
        });
      }),
      { numRuns: 150 },
    );
  });

  test("a planet of no mass still has an uncertain mass", () => {
    // a = (G (M + m) P^2 / 4 pi^2)^(1/3): dlna/dm = 1 / (3 M) at m = 0.
    const [value, sigma] = call("AXIS", 365.25, 2, [[0, 0.3]], "d; solMass; solMass")[0] as [number, number];
    expect(Math.abs(sigma / value / (0.3 / 6) - 1)).toBeLessThan(relative);
  });

  test("independent inputs add in quadrature", () => {
    fc.assert(
      fc.property(
        system,
        fc.array(fc.double({ min: 1e-6, max: 0.2, noNaN: true }), { minLength: 5, maxLength: 5 }),
        (one, parts) => {
          const { headers, inputs, derivatives } = orbitalLaws.find((law) => law.function === "PLANETMASS")!;
          const values = inputs(one);
          const sigmas = values.map((value, index) => (value || 1) * parts[index]!);
          const given = values.map((value, index): Given => [[value, sigmas[index]!]]);
          const [value, sigma] = callOf("PLANETMASS", given, headers)[0] as [number, number];
          const squares = derivatives(one).map((derivative, index) => (derivative * sigmas[index]!) ** 2);
          const expected = Math.sqrt(squares.reduce((sum, square) => sum + square, 0));
          expect(Math.abs(sigma / value / expected - 1)).toBeLessThanOrEqual(relative);
        },
      ),
      { numRuns: 150 },
    );
  });
});

describe("the mass of 51 Peg b", () => {
  // sigma_m/m = 0.0329726273: computed with mpmath from the logarithmic derivatives of the mass function, for
  // P = 4.230785(36) d, K = 55.94(69) m/s, M = 1.09(5) solMass, e = 0.013(12) (Butler et al. 2006 ApJ 646, 505; K and M
  // from memory).
  const expected = 0.0329726273;

  test("as quantity texts", () => {
    const [mass, sigma] = call(
      "MINMASS",
      "55.94(69) m/s",
      "4.230785(36) d",
      "1.09 ± 0.05 solMass",
      "0.013(12)",
    )[0] as number[];
    expect(sigma! / mass!).toBeCloseTo(expected, 10);
  });

  test("as columns with uncertainties beside them, under one header each", () => {
    const [mass, sigma] = call(
      "MINMASS",
      [[55.94, 0.69]],
      [[4.230785, 0.000036]],
      [[1.09, 0.05]],
      [[0.013, 0.012]],
      "K [m/s]; P [d]; Mass [solMass]; e",
    )[0] as number[];
    expect(sigma! / mass!).toBeCloseTo(expected, 10);
  });

  test("as columns under a header for every column, in units of their own", () => {
    const [mass, sigma] = call(
      "MINMASS",
      [[55.94, 69]],
      [[4.230785, 3.1104]],
      [[1.09, 0.05]],
      [[0.013, 1.2]],
      "K [m/s]; e_K [cm/s]; P [d]; e_P [s]; Mass [solMass]; e_Mass; e; e_e [%]",
    )[0] as number[];
    expect(sigma! / mass!).toBeCloseTo(expected, 10);
  });

  test("whatever unit the result is asked for in", () => {
    for (const unit of ["earthMass", "kg", "solMass"]) {
      const arguments_ = ["55.94(69) m/s", "4.230785(36) d", "1.09 ± 0.05 solMass", "0.013(12)", undefined, unit];
      const [mass, sigma] = call("MINMASS", ...arguments_)[0] as number[];
      expect(sigma! / mass!).toBeCloseTo(expected, 10);
    }
  });
});

describe("upper and lower uncertainties", () => {
  const plus = 0.06;
  const minus = 0.02;
  const fraction = (name: string, ...given: Given[]) => {
    const [value, upper, lower] = call(name, ...given)[0] as number[];
    return [upper! / value!, lower! / value!];
  };

  test("keep their sides where the law rises", () => {
    // a ~ P^(2/3)
    const [upper, lower] = fraction("AXIS", [[3, plus, minus]], 1, undefined, "d; solMass");
    expect(upper).toBeCloseTo((2 / 3) * (plus / 3), 9);
    expect(lower).toBeCloseTo((2 / 3) * (minus / 3), 9);
  });

  test("change sides where it falls", () => {
    // K ~ P^(-1/3)
    const [upper, lower] = fraction(
      "REFLEX",
      [[3, plus, minus]],
      1,
      1,
      undefined,
      undefined,
      "d; solMass; jupiterMass",
    );
    expect(upper).toBeCloseTo((1 / 3) * (minus / 3), 9);
    expect(lower).toBeCloseTo((1 / 3) * (plus / 3), 9);
  });

  test("meet, each side apart, where one input rises and another falls", () => {
    // M + m = 4 pi^2 a^3 / (G P^2): 3 of the axis, -2 of the period.
    const [upper, lower] = fraction("TOTALMASS", [[1, 0.01, 0.03]], [[365.25, 5, 1]], "AU; d");
    expect(upper).toBeCloseTo(Math.hypot(0.03, 2 / 365.25), 9);
    expect(lower).toBeCloseTo(Math.hypot(0.09, 10 / 365.25), 9);
  });

  test("mix with symmetric ones", () => {
    const [upper, lower] = fraction("TOTALMASS", [[1, 0.01, 0.03]], [[365.25, 5]], "AU; d");
    expect(upper).toBeCloseTo(Math.hypot(0.03, 10 / 365.25), 9);
    expect(lower).toBeCloseTo(Math.hypot(0.09, 10 / 365.25), 9);
  });

  test("read alike as cells and as text", () => {
    const cells = call("AXIS", [[3, plus, minus]], 1, undefined, "d; solMass");
    expect(call("AXIS", "3 +0.06 -0.02 d", "1 solMass")).toEqual(cells);
  });

  test("may be written with any sign", () => {
    const cells = call("AXIS", [[3, plus, minus]], 1, undefined, "d; solMass");
    expect(call("AXIS", [[3, plus, -minus]], 1, undefined, "d; solMass")).toEqual(cells);
    expect(call("AXIS", [[3, -plus, -minus]], 1, undefined, "d; solMass")).toEqual(cells);
    const one = call("AXIS", [[3, plus]], 1, undefined, "d; solMass");
    expect(call("AXIS", [[3, -plus]], 1, undefined, "d; solMass")).toEqual(one);
  });
});

describe("an uncertainty that does not read", () => {
  const value = call("AXIS", 3, 1, undefined, "d; solMass")[0]![0];

  test("that is blank leaves the value and says #N/A beside it", () => {
    const [[number, sigma]] = call("AXIS", [[3, null]], 1, undefined, "d; solMass") as [[number, CellError]];
    expect(number).toBe(value);
    expect(sigma.code).toBe("#N/A");
    expect(sigma.message).toContain("uncertainty of period is blank");
  });

  test("that is text leaves the value and says #VALUE! beside it", () => {
    const [[number, sigma]] = call("AXIS", [[3, "small"]], 1, undefined, "d; solMass") as [[number, CellError]];
    expect(number).toBe(value);
    expect(sigma.code).toBe("#VALUE!");
    expect(sigma.message).toContain('uncertainty of period is "small", not a number');
  });

  test("that is an error passes it on", () => {
    const gone = new CellError("#REF!", "elsewhere", "gone");
    const [row] = call("AXIS", [[3, gone, 0.1]], 1, undefined, "d; solMass");
    expect(row).toEqual([value, gone, gone]);
  });

  test("that is too large for a number says so", () => {
    const [[number, sigma]] = call("AXIS", [[3, 1e308]], 1, undefined, "d; solMass") as [[number, CellError]];
    expect(number).toBe(value);
    expect(sigma).toBeInstanceOf(CellError);
    expect(sigma.code).toBe("#VALUE!");
  });

  test("and where the value does not read either, its error stands in both cells: a blank would count as 0 later on", () => {
    for (const [row] of [
      call("AXIS", [[null, null]], 1, undefined, "d; solMass"),
      call("AXIS", [[4.23, 0.1]], "about 1", undefined, "d; solMass"),
      call("INTO", [["soon", 0.1]], "d", "h"),
    ]) {
      expect(row).toHaveLength(2);
      expect(row![0]).toBeInstanceOf(CellError);
      expect(row![1]).toBe(row![0]);
    }
  });
});

describe("conversion carries uncertainties by the exact slope", () => {
  test("linear", () => {
    expect(call("INTO", "2 ± 0.5 d", undefined, "h")[0]).toEqual([48, 12]);
    expect(call("INTO", "2 +0.5 -0.25 d", undefined, "h")[0]).toEqual([48, 12, 6]);
    expect(call("INTO", [[2, 0.5]], "d", "h")[0]).toEqual([48, 12]);
    expect(call("INTO", [[2, 6]], "d; h", "d")[0]).toEqual([2, 0.25]);
    expect(call("INTO", "20 ± 0.5 degC", undefined, "K")[0]).toEqual([293.15, 0.5]);
  });

  test("of and to a logarithm", () => {
    // d(10^x) = ln 10 10^x dx; 2 dex +- 0.1 dex.
    const [value, sigma] = call("INTO", "2 ± 0.1 dex", undefined, "1")[0] as number[];
    expect(value).toBeCloseTo(100, 12);
    expect(sigma).toBeCloseTo(Math.LN10 * 10, 12);
    const [log, part] = call("INTO", "1E4 ± 100 %", undefined, "dex")[0] as number[];
    expect(log).toBeCloseTo(2, 14);
    expect(part).toBeCloseTo(0.01 / Math.LN10, 14);
  });

  test("TAG keeps them in its text", () => {
    expect(call("TAG", [[4.2308, 0.0002]], "d")).toEqual([["4.2308 ± 0.0002 d"]]);
    expect(call("TAG", [[0.47, -0.03, 0.02]], "Mjup")).toEqual([["0.47 +0.03 -0.02 jupiterMass"]]);
    expect(call("TAG", [[4.2308, null]], "d")[0]![0]).toBe("4.2308 d");
  });
});
