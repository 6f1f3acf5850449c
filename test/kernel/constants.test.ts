import { describe, expect, test } from "vitest";
import * as kernelConstants from "../../src/kernel/constants.js";
import { relativeError } from "./relativeError.js";

const { constants } = kernelConstants;

function constantOf(name: string): number {
  const constant = constants.find((candidate) => candidate.name === name);
  if (constant === undefined) throw new Error(`no constant ${name}`);
  return constant.value;
}

describe("values as the standards print them", () => {
  test.each([
    ["c", 299792458, "m/s", "SI Brochure, 9th edition (2019)"],
    ["h", 6.62607015e-34, "J.s", "SI Brochure, 9th edition (2019)"],
    ["k", 1.380649e-23, "J/K", "SI Brochure, 9th edition (2019)"],
    ["e", 1.602176634e-19, "C", "SI Brochure, 9th edition (2019)"],
    ["N_A", 6.02214076e23, "mol**-1", "SI Brochure, 9th edition (2019)"],
    ["G", 6.6743e-11, "m**3/(kg.s**2)", "CODATA 2018 and 2022, 6.67430(15)e-11"],
    ["u", 1.66053906892e-27, "kg", "CODATA 2022, 1.66053906892(52)e-27"],
    ["day", 86400, "s", "SI Brochure, 9th edition (2019), table 8"],
    ["year", 31557600, "s", "IAU Style Manual (1989): Julian year of 365.25 d"],
    ["au", 149597870700, "m", "IAU 2012 Resolution B2"],
    ["lyr", 9460730472580800, "m", "IAU: c times a Julian year"],
    ["GM_sun", 1.3271244e20, "m**3/s**2", "IAU 2015 Resolution B3"],
    ["GM_jupiter", 1.2668653e17, "m**3/s**2", "IAU 2015 Resolution B3"],
    ["GM_earth", 3.986004e14, "m**3/s**2", "IAU 2015 Resolution B3"],
    ["R_sun", 6.957e8, "m", "IAU 2015 Resolution B3"],
    ["R_jupiter", 7.1492e7, "m", "IAU 2015 Resolution B3, equatorial"],
    ["R_jupiter_polar", 6.6854e7, "m", "IAU 2015 Resolution B3, polar"],
    ["R_earth", 6.3781e6, "m", "IAU 2015 Resolution B3, equatorial"],
    ["R_earth_polar", 6.3568e6, "m", "IAU 2015 Resolution B3, polar"],
    ["L_sun", 3.828e26, "W", "IAU 2015 Resolution B3"],
    ["S_sun", 1361, "W/m**2", "IAU 2015 Resolution B3"],
    ["Teff_sun", 5772, "K", "IAU 2015 Resolution B3"],
    ["L_0", 3.0128e28, "W", "IAU 2015 Resolution B2"],
    // Nearest doubles to values computed with mpmath from the exact definitions.
    ["pc", Number("30856775814913672.789"), "m", "IAU 2015 Resolution B2, 648000/pi au; computed: mpmath"],
    [
      "sigma_SB",
      Number("5.67037441918442945397e-8"),
      "W/(m**2.K**4)",
      "SI (2019), 2 pi^5 k^4/(15 h^3 c^2); computed: mpmath",
    ],
  ])("%s is %d %s (%s)", (name, value, unit) => {
    expect(constants.find((constant) => constant.name === name)).toMatchObject({ value, unit });
  });
});

describe("what follows from them", () => {
  const rows: readonly (readonly [string, number, number, number, string])[] = [
    ["M_sun/M_earth", constantOf("GM_sun") / constantOf("GM_earth"), 332946.07832807, 1e-14, "computed: mpmath"],
    ["M_sun/M_jupiter", constantOf("GM_sun") / constantOf("GM_jupiter"), 1047.56551466048, 1e-14, "computed: mpmath"],
    [
      "M_jupiter/M_earth",
      constantOf("GM_jupiter") / constantOf("GM_earth"),
      317.828406594675,
      1e-14,
      "computed: mpmath",
    ],
    ["R_sun/R_earth", constantOf("R_sun") / constantOf("R_earth"), 109.07637070601, 1e-14, "computed: mpmath"],
    ["R_jupiter/R_earth", constantOf("R_jupiter") / constantOf("R_earth"), 11.2089807309387, 1e-14, "computed: mpmath"],
    ["au/R_sun", constantOf("au") / constantOf("R_sun"), 215.032155670548, 1e-14, "computed: mpmath"],
    ["au/yr", constantOf("au") / constantOf("year"), 4740.47046353335, 1e-14, "computed: mpmath"],
    ["M_sun", constantOf("M_sun"), 1.98841e30, 1e-6, "1.98841e30 kg, Astronomical Almanac 2024 (from memory)"],
    ["M_jupiter", constantOf("M_jupiter"), 1.898125e27, 1e-6, "computed: mpmath"],
    ["M_earth", constantOf("M_earth"), 5.972168e24, 1e-6, "5.9722e24 kg, Astronomical Almanac (from memory)"],
    [
      "R (molar gas)",
      constantOf("N_A") * constantOf("k"),
      8.31446261815324,
      1e-14,
      "SI (2019): 8.31446261815324 exactly",
    ],
    ["f_0", constantOf("f_0"), 2.518021002e-8, 4e-10, "IAU 2015 Resolution B2: 2.518021002...e-8"],
    ["f_0", constantOf("f_0"), 2.5180210026334e-8, 1e-14, "L_0/(4 pi (10 pc)^2); computed: mpmath"],
    [
      "log g of the Sun",
      Math.log10((100 * constantOf("GM_sun")) / constantOf("R_sun") ** 2),
      4.4380676273,
      1e-11,
      "computed: mpmath",
    ],
  ];

  test.each(rows)("%s", (_, actual, expected, tolerance) => {
    expect(relativeError(actual, expected)).toBeLessThanOrEqual(tolerance);
  });
});

describe("the list", () => {
  test("has every name once, with a meaning, a unit and a source", () => {
    expect(new Set(constants.map((constant) => constant.name)).size).toBe(constants.length);
    for (const constant of constants) {
      expect(constant.meaning).toMatch(/^[a-zA-Z]/);
      expect(constant.unit).toMatch(/^[A-Za-z][A-Za-z0-9*./()-]*$/);
      expect(constant.definedBy).toMatch(/SI|CODATA|IAU|exact/);
    }
  });

  test("holds every number that the kernels and the unit table import", () => {
    const exported = Object.entries(kernelConstants).filter(([, value]) => typeof value === "number");
    expect(exported.length).toBeGreaterThan(20);
    for (const [name, value] of exported) {
      expect(
        constants.map((constant) => constant.value),
        name,
      ).toContain(value);
    }
  });
});
