import { describe, expect, test } from "vitest";
import { quantityText } from "../../src/units/quantityText.js";
import { quantityOf, quantityProblemOf } from "./unitsOf.js";

type Row = readonly [
  text: string,
  value: number,
  upper: number | undefined,
  lower: number | undefined,
  unit: string | undefined,
];

const none = undefined;

// How papers and tables write numbers; forms without a source are common practice.
const forms: readonly Row[] = [
  ["4.23 d", 4.23, none, none, "d"],
  ["4.23d", 4.23, none, none, "d"],
  ["  4.23   d  ", 4.23, none, none, "d"],
  ["4.23", 4.23, none, none, none],
  ["+4.23 d", 4.23, none, none, "d"],
  ["-4.23 km/s", -4.23, none, none, "km/s"],
  [".5 d", 0.5, none, none, "d"],
  ["5. d", 5, none, none, "d"],
  ["5 %", 5, none, none, "%"],
  ["12.5 km s-1", 12.5, none, none, "km/s"],
  ["4.23 [d]", 4.23, none, none, "d"],
  ["4.44 log(cm/s**2)", 4.44, none, none, "log(cm/s**2)"],
  ["4.44 [cm/s2]", 4.44, none, none, "cm/s**2"],
  // Exponents.
  ["1e5 m", 1e5, none, none, "m"],
  ["1E-5 m", 1e-5, none, none, "m"],
  ["1.5e+3m", 1500, none, none, "m"],
  ["1.5 x 10^5 m", 1.5e5, none, none, "m"],
  ["1.5\u00d710^-5 m", 1.5e-5, none, none, "m"],
  ["1.5\u00d710**5 m", 1.5e5, none, none, "m"],
  ["2 eV", 2, none, none, "eV"],
  ["2 earthMass", 2, none, none, "earthMass"],
  // Minus signs of typesetters.
  ["\u22123.2 km/s", -3.2, none, none, "km/s"],
  ["\u20133.2 km/s", -3.2, none, none, "km/s"],
  // Uncertainties of the last digits, in brackets (GUM, JCGM 100:2008, 7.2.2).
  ["4.2308(2) d", 4.2308, 0.0002, 0.0002, "d"],
  ["4.230785(36)d", 4.230785, 0.000036, 0.000036, "d"],
  ["55.94(69) m/s", 55.94, 0.69, 0.69, "m/s"],
  ["120(15) pc", 120, 15, 15, "pc"],
  ["12.3(1.5) m/s", 12.3, 1.5, 1.5, "m/s"],
  ["1.23(4)e5 m", 1.23e5, 4e3, 4e3, "m"],
  ["6.67430(15)e-11 m**3.kg**-1.s**-2", 6.6743e-11, 1.5e-15, 1.5e-15, "m**3.kg**-1.s**-2"],
  ["1.2e-3(4) s", 1.2e-3, 4e-4, 4e-4, "s"],
  ["4.2308(0) d", 4.2308, 0, 0, "d"],
  ["-0.05(2)", -0.05, 0.02, 0.02, none],
  // Plus-minus.
  ["0.47 \u00b1 0.02 jupiterMass", 0.47, 0.02, 0.02, "jupiterMass"],
  ["0.47\u00b10.02Mjup", 0.47, 0.02, 0.02, "jupiterMass"],
  ["0.47 +- 0.02 jupiterMass", 0.47, 0.02, 0.02, "jupiterMass"],
  ["0.47 +/- 0.02 jupiterMass", 0.47, 0.02, 0.02, "jupiterMass"],
  ["0.47+/-0.02", 0.47, 0.02, 0.02, none],
  ["(0.47 \u00b1 0.02) jupiterMass", 0.47, 0.02, 0.02, "jupiterMass"],
  ["4.23 \u00b1 1e-3 d", 4.23, 1e-3, 1e-3, "d"],
  ["4.23 \u00b1 -0.02 d", 4.23, 0.02, 0.02, "d"],
  // Two sides.
  ["0.47 +0.03 -0.02 jupiterMass", 0.47, 0.03, 0.02, "jupiterMass"],
  ["0.47 +0.03/-0.02 jupiterMass", 0.47, 0.03, 0.02, "jupiterMass"],
  ["0.47 (+0.03 -0.02) jupiterMass", 0.47, 0.03, 0.02, "jupiterMass"],
  ["0.47 (+0.03, -0.02) jupiterMass", 0.47, 0.03, 0.02, "jupiterMass"],
  ["0.47 +0.03 \u22120.02 jupiterMass", 0.47, 0.03, 0.02, "jupiterMass"],
  ["0.47+0.03-0.02", 0.47, 0.03, 0.02, none],
  // A number with an instant for its unit.
  ["2455260.75 JD_UTC", 2455260.75, none, none, "JD_UTC"],
  ["5260.751(2) BJD_TDB-2450000", 5260.751, 0.002, 0.002, "BJD_TDB-2450000"],
];

describe("quantity texts", () => {
  test.each(forms)("%s", (text, value, upper, lower, unit) => {
    const read = quantityOf(text);
    expect(read.value).toBe(value);
    expect(read.upper).toBe(upper);
    expect(read.lower).toBe(lower);
    expect(read.unit?.text).toBe(unit);
  });

  test.each(forms)("%s is written so that it reads back", (text) => {
    const { unit, ...numbers } = quantityOf(text);
    const { unit: again, ...same } = quantityOf(quantityText({ ...numbers, unit }));
    expect(same).toEqual(numbers);
    expect(again?.text).toBe(unit?.text);
  });

  test("are written with \u00b1, or with both sides", () => {
    expect(quantityText(quantityOf("4.2308(2) days"))).toBe("4.2308 \u00b1 0.0002 d");
    expect(quantityText(quantityOf("0.47 +0.03 -0.02 Mjup"))).toBe("0.47 +0.03 -0.02 jupiterMass");
    expect(quantityText(quantityOf("0.05(2)"))).toBe("0.05 \u00b1 0.02");
    expect(quantityText(quantityOf("3 [10**27kg]"))).toBe("3 [10**27kg]");
  });
});

describe("texts that are no quantity", () => {
  test.each([
    "",
    " ",
    "-",
    "d",
    "n/a",
    "NaN",
    "Infinity",
    "inf",
    "about 3 d",
    "~3 d",
    "<3 d",
    "> 0.5 jupiterMass",
    "3-4 d",
    "3 - 4 d",
    "1 234 d",
    "1.2.3 d",
    "5 .2 d",
    "4 1/2 d",
    "0.47 +0.03 m",
    "5 -0.02 m",
    "1e400 d",
    "1 \u00b1 1e400 d",
    "(4.23 d",
    "2010-02-30",
    "2010-13-01",
    "06:30:00",
  ])("%j", (text) => {
    const problem = quantityProblemOf(text);
    expect(["not a number", "unknown unit"]).toContain(problem.problem);
    expect(problem.text).not.toBe(undefined);
  });

  test.each([
    ["4,23 d", "4.23 d"],
    ["0,47", "0.47"],
    ["1,234 d", "1.234 d or 1234 d"],
    ["4.23 d \u00b1 0.02 d", "4.23 \u00b1 0.02 d"],
    ["4.23 d +- 0.02", "4.23 \u00b1 0.02 d"],
  ])("%s: write %s", (text, hint) => {
    expect(quantityProblemOf(text)).toEqual({ problem: "not a number", text, hint });
    for (const one of hint.split(" or ")) quantityOf(one);
  });

  test.each([
    ["4.23 dayz", "unknown unit"],
    ["4.23 M", "ambiguous unit"],
    ["4.23 m/s/s", "unit grammar"],
    ["4.23 d?", "unknown unit"],
    ["4.2308(2", "unknown unit"],
    ["4.23 \u00b1 d", "unknown unit"],
    ["0x10", "unknown unit"],
    ["24:00", "unknown unit"],
    ["1e", "unknown unit"],
  ])("%s: %s", (text, problem) => {
    expect(quantityProblemOf(text).problem).toBe(problem);
  });
});
