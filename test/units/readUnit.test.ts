import { all, create } from "mathjs";
import { describe, expect, test } from "vitest";
import { ambiguousUnits } from "../../src/units/ambiguousUnits.js";
import { prefixes } from "../../src/units/prefixes.js";
import { isProblem } from "../../src/units/problem.js";
import { readUnit } from "../../src/units/readUnit.js";
import { convertible } from "../../src/units/unit.js";
import { unitTable } from "../../src/units/unitTable.js";
import { readTable } from "../kernel/table.js";
import { convert, problemOf, unitOf } from "./unitsOf.js";

const known = readTable(new URL("vounits.csv", import.meta.url));
const spellings = readTable(new URL("spellings.csv", import.meta.url));
const conversions = readTable(new URL("conversions.csv", import.meta.url));

/** G of CODATA 2018 and 2022; masses are carried as G times the mass. */
const G = 6.6743e-11;

// IVOA VOUnits 1.1, section 2.3: the 24 prefixes of the SI brochure, 9th ed. with the four of 2022.
const siPrefixes: Readonly<Record<string, number>> = {
  ...{ da: 1, h: 2, k: 3, M: 6, G: 9, T: 12, P: 15, E: 18, Z: 21, Y: 24, R: 27, Q: 30 },
  ...{ d: -1, c: -2, m: -3, u: -6, n: -9, p: -12, f: -15, a: -18, z: -21, y: -24, r: -27, q: -30 },
};

describe("the known units of VOUnits 1.1", () => {
  test("the table is whole", () => expect(known.length).toBe(70));

  test.each(known.filter(({ prefixes }) => prefixes !== "refused"))("$symbol", ({ symbol, kind, scale }) => {
    const unit = unitOf(symbol!);
    if (kind !== "") expect(unit.kind).toBe(kind);
    if (scale !== "") {
      const size = unit.times / unit.over / (kind === "mass" ? G : 1);
      // A solar mass in kg is known to the five digits of G; the measured constants to some nine.
      const tolerance = symbol === "solMass" ? 5e-7 : 1e-8;
      expect(Math.abs(size / Number(scale) - 1)).toBeLessThan(tolerance);
    }
  });

  test.each(known.filter(({ prefixes }) => prefixes === "yes"))("$symbol takes every SI prefix", ({ symbol }) => {
    const plain = unitOf(symbol!);
    const spelled = new Set(known.map((row) => row.symbol));
    for (const [prefix, exponent] of Object.entries(siPrefixes)) {
      const text = `${prefix}${symbol}`;
      // A known unit wins over a prefix, a word over both, and what tables use for two things is refused.
      if (spelled.has(text) || Object.hasOwn(ambiguousUnits, text) || claimed(text)) continue;
      const unit = unitOf(text);
      expect(unit.kind, text).toBe(plain.kind);
      expect(unit.times / unit.over / (plain.times / plain.over) / 10 ** exponent, text).toBeCloseTo(1, 12);
    }
  });

  /** Spellings that practice has for another unit. */
  function claimed(text: string): boolean {
    return unitTable.some(
      (row) => row.spellings.includes(text) || row.words.includes(text.toLowerCase()) || row.symbol === text,
    );
  }

  test("what is claimed by practice is little", () => {
    const texts = known
      .filter((row) => row.prefixes === "yes")
      .flatMap(({ symbol }) => Object.keys(siPrefixes).map((prefix) => `${prefix}${symbol}`))
      .filter(
        (text) => !known.some((row) => row.symbol === text) && (claimed(text) || Object.hasOwn(ambiguousUnits, text)),
      );
    // Refused: MJ MS Ms RJ, and as (second of arc or attosecond). The same either way: kg.
    expect(texts.sort()).toEqual(["MJ", "MS", "Ms", "RJ", "as", "kg"]);
  });

  test.each(known.filter(({ prefixes }) => prefixes === "no"))("$symbol takes none", ({ symbol }) => {
    for (const prefix of ["k", "m", "u", "G", "n"]) {
      const unit = readUnit(`${prefix}${symbol}`);
      if (isProblem(unit)) continue;
      // It reads, but as another unit: mAU is no thousandth of an AU, and Gau is no gigau.
      expect(unit.text, `${prefix}${symbol}`).not.toBe(`${prefix}${unitOf(symbol!).text}`);
    }
  });

  test("R is refused, with the radii it may be", () => {
    const problem = problemOf("R");
    expect(problem).toMatchObject({ problem: "ambiguous unit", text: "R" });
  });

  test("prefixes are the SI's, and the two characters for micro", () => {
    const { "\u00b5": sign, "\u03bc": letter, ...rest } = prefixes;
    expect(rest).toEqual(siPrefixes);
    expect([sign, letter]).toEqual([-6, -6]);
  });
});

describe("unit texts", () => {
  test.each(spellings)("$text is $reads ($source)", ({ text, reads }) => {
    expect(unitOf(text!).text).toBe(reads);
  });

  test.each(["", " ", "1"])('%j is the plain number ("no unit" is the empty string in VOUnits)', (text) => {
    expect(unitOf(text)).toMatchObject({ kind: "ratio", times: 1, over: 1, plus: 0, text: "1" });
  });

  test.each([
    ["m/s/s", "m/(s.s)"],
    ["km/s/Mpc", "km/(s.Mpc)"],
    ["erg/s/cm^2", "erg/(s.cm^2)"],
    ["W/m2.um", "W/(m2.um)"],
  ])("%s reads in more than one way; %s in one", (text, write) => {
    expect(problemOf(text)).toEqual({ problem: "unit grammar", text, write });
    unitOf(write);
  });

  test.each([
    "unknown", // the literal of VOUnits for a unit that is not known
    "furlong",
    "m**",
    "m**x",
    "m**(1/0)",
    "m**0",
    "(m",
    "m)",
    "m//s",
    "/",
    ".",
    "..m",
    "m..s",
    "10**3",
    "1.5",
    "0m",
    "1E400m",
    "log(log(m))",
    "log(degC)",
    "log(JD_UTC)",
    "exp(m)",
    "mmas",
    "kAU",
    "JD_XYZ",
    "sin i",
    "\u0000",
    "(".repeat(10000),
    "m.".repeat(10000),
  ])("%j is no unit", (text) => {
    expect(problemOf(text).problem).toBe("unknown unit");
  });

  test("kinds are more than dimensions", () => {
    expect(convertible(unitOf("deg"), unitOf("%"))).toBe(false);
    expect(convertible(unitOf("mag"), unitOf("%"))).toBe(false);
    expect(convertible(unitOf("JD_UTC"), unitOf("d"))).toBe(false);
    expect(convertible(unitOf("JD_UTC"), unitOf("BJD_TDB"))).toBe(false);
    expect(convertible(unitOf("MJD_UTC"), unitOf("JD_UTC"))).toBe(true);
    expect(convertible(unitOf("Hz"), unitOf("rad/s"))).toBe(false);
    expect(convertible(unitOf("pixel"), unitOf("count"))).toBe(false);
    expect(convertible(unitOf("adu"), unitOf("count"))).toBe(false);
    expect(convertible(unitOf("N.m"), unitOf("J"))).toBe(true);
    expect(convertible(unitOf("kg.m.s**-2"), unitOf("N"))).toBe(true);
    expect(convertible(unitOf("photon"), unitOf("electron"))).toBe(true);
    expect(unitOf("kg.m**3.s").kind).toBe("kg.m**3.s");
  });
});

describe("conversions", () => {
  test.each(conversions)("$value $from is $expected $to ($source)", ({ value, from, to, expected, tolerance }) => {
    const found = convert(Number(value), from!, to!);
    const wanted = Number(expected);
    expect(Math.abs(found - wanted)).toBeLessThanOrEqual(Number(tolerance) * Math.abs(wanted));
    // And back.
    const back = convert(found, to!, from!);
    expect(Math.abs(back - Number(value))).toBeLessThanOrEqual(4e-15 * Math.max(Math.abs(Number(value)), 1));
  });

  // A general-purpose mathematics library, with its own table of units.
  const algebra = create(all!);
  test.each([
    ["min", "minute", "s"],
    ["h", "hour", "s"],
    ["d", "day", "s"],
    ["wk", "week", "s"],
    ["Angstrom", "angstrom", "m"],
    ["deg", "deg", "rad"],
    ["arcmin", "arcmin", "rad"],
    ["arcsec", "arcsec", "rad"],
    ["N", "N", "kg m s^-2"],
    ["Pa", "Pa", "kg m^-1 s^-2"],
    ["bar", "bar", "Pa"],
    ["J", "J", "kg m^2 s^-2"],
    ["erg", "erg", "J"],
    ["eV", "eV", "J"],
    ["W", "W", "J s^-1"],
    ["C", "C", "A s"],
    ["V", "V", "J A^-1 s^-1"],
    ["Ohm", "ohm", "V A^-1"],
    ["S", "S", "A V^-1"],
    ["F", "F", "C V^-1"],
    ["H", "H", "V s A^-1"],
    ["Wb", "Wb", "V s"],
    ["T", "T", "V s m^-2"],
    ["g", "g", "kg"],
    ["byte", "byte", "bits"],
    ["km/h", "km/h", "m/s"],
    ["g/cm**3", "g/cm^3", "kg/m^3"],
    ["erg/(s.cm**2)", "erg/(s cm^2)", "W/m^2"],
  ])("%s has the size that %s has in a library of its own", (text, theirs, si) => {
    const unit = unitOf(text);
    const own = unit.times / unit.over / (unit.kind === "mass" ? G : 1);
    // Its electronvolt is that of CODATA 2010.
    const tolerance = text === "eV" ? 5e-8 : 1e-12;
    expect(Math.abs(own / algebra.unit(`1 ${theirs}`).toNumber(si) - 1)).toBeLessThan(tolerance);
  });
});

describe("spellings with two meanings are refused with the choices", () => {
  test.each(Object.entries(ambiguousUnits))("%s", (text, choices) => {
    const problem = problemOf(text);
    expect(problem).toEqual({ problem: "ambiguous unit", text, choices });
    expect(choices.length).toBeGreaterThan(0);
    // Each choice is a unit, and is not refused itself.
    for (const { symbol, meaning } of choices) {
      expect(unitOf(symbol).text).toBe(unitOf(unitOf(symbol).text).text);
      expect(meaning.length).toBeGreaterThan(2);
    }
  });

  test.each(["M", "R", "MJ", "Me", "JD", "'"])("%s is among them, and in a product it is refused too", (text) => {
    expect(Object.hasOwn(ambiguousUnits, text)).toBe(true);
    expect(problemOf(text === "JD" ? text : `${text}/s`).problem).toBe("ambiguous unit");
  });

  test("an electron mass is what CODATA says", () => {
    const choice = ambiguousUnits.Me!.find(({ meaning }) => meaning === "electron mass")!;
    // 9.1093837139(28)e-31 kg, CODATA 2022 (from memory)
    const unit = unitOf(choice.symbol);
    expect(Math.abs(unit.times / unit.over / G / 9.1093837139e-31 - 1)).toBeLessThan(1e-8);
  });
});

describe("a slip of the keyboard finds the unit that was meant", () => {
  test.each([
    ["Mjupp", "jupiterMass"],
    ["Mjpu", "jupiterMass"],
    ["jupitermas", "jupiterMass"],
    ["solmas", "solMass"],
    ["Msunn", "solMass"],
    ["earthMas", "earthMass"],
    ["dayz", "d"],
    ["dasy", "d"],
    ["huors", "h"],
    ["yeras", "yr"],
    ["arcsecc", "arcsec"],
    ["Angstrm", "Angstrom"],
    ["degres", "deg"],
    ["pixle", "pixel"],
    ["mertes", "m"],
  ])("%s: %s", (text, symbol) => {
    expect(problemOf(text)).toMatchObject({ problem: "unknown unit", nearest: { symbol } });
  });

  test.each(["x", "furlong", "kmps", "fortnight", "unknown", "zzz"])("%s: nothing is near", (text) => {
    expect(problemOf(text)).toEqual({ problem: "unknown unit", text, nearest: undefined });
  });
});
