import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { ambiguousUnits } from "../../src/units/ambiguousUnits.js";
import { kindPhrase, kinds } from "../../src/units/kind.js";
import { prefixes } from "../../src/units/prefixes.js";
import { isProblem } from "../../src/units/problem.js";
import { quantityText } from "../../src/units/quantityText.js";
import { readHeader } from "../../src/units/readHeader.js";
import { readQuantity } from "../../src/units/readQuantity.js";
import { readUnit } from "../../src/units/readUnit.js";
import { fromBase, toBase, type Unit } from "../../src/units/unit.js";
import { unitTable } from "../../src/units/unitTable.js";
import { unitOf } from "./unitsOf.js";

const symbols = unitTable.map(({ symbol }) => symbol);
const prefixed = unitTable
  .filter((row) => row.prefixes)
  .flatMap(({ symbol }) => Object.keys(prefixes).map((prefix) => `${prefix}${symbol}`))
  .filter((text) => !Object.hasOwn(ambiguousUnits, text));
const instants = ["JD_UTC", "BJD_TDB", "MJD_TT", "HJD_UTC", "BJD_TDB-2450000", "BMJD_TDB-50000.5", "JD_UT1-2451545"];

describe("the table of units", () => {
  test("every spelling and word means one unit", () => {
    const texts = unitTable.flatMap(({ symbol, spellings, words }) => [symbol, ...spellings, ...words]);
    expect(new Set(texts).size).toBe(texts.length);
    for (const text of texts) expect(Object.hasOwn(ambiguousUnits, text), text).toBe(false);
  });

  test.each(unitTable)("$symbol: every way to write it reads as it", ({ symbol, spellings, words, source }) => {
    expect(source).not.toBe("");
    const unit = unitOf(symbol);
    expect(unit.text).toBe(symbol);
    for (const text of [...spellings, ...words, ...words.map((word) => word.toUpperCase())]) {
      expect(readUnit(text), text).toEqual(unit);
    }
  });

  test("every kind has a phrase and a base that is a unit of it", () => {
    for (const [kind, { base }] of Object.entries(kinds)) {
      expect(kindPhrase(kind)).toMatch(/^an? /);
      if (kind !== "instant") expect(unitOf(base).kind).toBe(kind);
    }
    expect(kindPhrase("kg.m**-2")).toBe("a quantity in kg.m**-2");
  });
});

const factor = fc
  .tuple(
    fc.constantFrom(...symbols.filter((symbol) => symbol !== "1"), ...prefixed),
    fc.constantFrom("", "", "", "**2", "**-1", "**(-2)", "**(1/2)", "**3", "**(1.5)"),
  )
  .map(([symbol, power]) => `${symbol}${power}`);
const compound = fc
  .tuple(
    fc.constantFrom("", "", "", "10**3", "10**-27", "1.5E3", "2"),
    fc.array(factor, { minLength: 1, maxLength: 4 }),
    fc.option(factor, { nil: undefined }),
  )
  .map(([scale, above, below]) => `${scale}${above.join(".")}${below === undefined ? "" : `/${below}`}`);
const unitLike = fc.oneof(
  fc.constantFrom(...symbols, ...prefixed, ...instants, "log(cm/s**2)", "ln(s)", "dex"),
  compound,
  fc.tuple(fc.constantFrom("log", "ln"), compound).map(([name, text]) => `${name}(${text})`),
);

describe("the canonical spelling is a fixed point", () => {
  test.each([...symbols, ...instants])("%s", (text) => {
    const unit = unitOf(text);
    expect(readUnit(unit.text)).toEqual(unit);
  });

  test("for every prefix and every compound, to the last bit", () => {
    let read = 0;
    fc.assert(
      fc.property(unitLike, (text) => {
        const unit = readUnit(text);
        if (isProblem(unit)) return;
        read++;
        const { meaning: _, ...again } = readUnit(unit.text) as Unit;
        const { meaning: __, ...first } = unit;
        expect(again).toEqual(first);
        // A header may hold it alone or in brackets, with the same result.
        expect(readHeader(`Name [${unit.text}]`).unit).toEqual(readUnit(unit.text));
        expect(readHeader(unit.text).unit, unit.text).toEqual(readUnit(unit.text));
      }),
      { numRuns: 800 },
    );
    expect(read).toBeGreaterThan(400);
  });

  test("it is VOUnits: no spaces, one division, powers by **", () => {
    fc.assert(
      fc.property(unitLike, (text) => {
        const unit = readUnit(text);
        if (isProblem(unit)) return;
        const plain = unit.text.replace(/\([^()]*\)/g, "");
        expect(unit.text).not.toMatch(/\s|\^/);
        expect(plain.split("/").length).toBeLessThanOrEqual(2);
        expect(plain.split("/")[1] ?? "").not.toContain(".");
      }),
    );
  });
});

const double = fc.double({ noNaN: true, noDefaultInfinity: true });
const sigma = fc.double({ min: 0, noNaN: true, noDefaultInfinity: true });

describe("quantity texts read back to the same doubles", () => {
  test("with any unit and any uncertainty", () => {
    fc.assert(
      fc.property(double, fc.constantFrom(0, 1, 2), sigma, sigma, unitLike, (value, sides, upper, lower, text) => {
        const unit = readUnit(text);
        if (isProblem(unit)) return;
        const quantity = {
          value: value === 0 ? 0 : value,
          upper: sides > 0 ? upper : undefined,
          lower: sides === 0 ? undefined : sides === 1 ? upper : lower,
          unit: unit.text === "1" ? undefined : unit,
        };
        const { unit: _, ...numbers } = quantity;
        const written = quantityText(quantity);
        const read = readQuantity(written);
        expect(read, written).toMatchObject(numbers);
        expect((read as { unit?: Unit }).unit?.text, written).toBe(quantity.unit?.text);
      }),
      { numRuns: 800 },
    );
  });
});

describe("to the base unit and back", () => {
  test("loses less than four roundings", () => {
    const plain = fc.constantFrom(...symbols.filter((symbol) => symbol !== "degC"), ...prefixed);
    fc.assert(
      fc.property(plain, fc.double({ min: 1e-100, max: 1e100, noNaN: true }), (text, value) => {
        const unit = unitOf(text);
        const base = toBase(unit, value);
        if (base === 0 || !Number.isFinite(base) || Math.abs(base) < 1e-290) return;
        expect(Math.abs(fromBase(unit, base) / value - 1)).toBeLessThanOrEqual(4 * 2 ** -53);
      }),
      { numRuns: 2000 },
    );
  });
});

describe("any text", () => {
  const token = fc.constantFrom(
    ..."0123456789.+-eE()[]{}/*^ ±,;:%'\"".split(""),
    "**",
    "10**",
    "+-",
    "\u2212",
    "d",
    "m",
    "km",
    "Mjup",
    "M",
    "log(",
    "sqrt(",
    "dex",
    "JD_UTC",
    "BJD_TDB-",
    "2010-03-05",
    "T06:00",
    "Z",
    "\n",
    "\u00b5",
    "__proto__",
    "constructor",
  );
  const garbage = fc.oneof(
    fc.array(token, { maxLength: 12 }).map((tokens) => tokens.join("")),
    fc.string({ unit: "binary", maxLength: 20 }),
    fc.string({ maxLength: 500 }),
  );
  const problems = ["unknown unit", "ambiguous unit", "unit grammar"];

  test("is a unit with a scale, or a problem that is declared", () => {
    fc.assert(
      fc.property(garbage, (text) => {
        const unit = readUnit(text);
        if (isProblem(unit)) expect(problems).toContain(unit.problem);
        else {
          expect(unit.times > 0 && unit.over > 0 && Number.isFinite(unit.times / unit.over)).toBe(true);
          expect(unit.text).not.toBe("");
          expect(Number.isFinite(unit.plus)).toBe(true);
        }
      }),
      { numRuns: 800 },
    );
  });

  test("is a quantity of finite numbers, or a problem that is declared", () => {
    fc.assert(
      fc.property(garbage, (text) => {
        const quantity = readQuantity(text);
        if (isProblem(quantity)) {
          expect([...problems, "not a number"]).toContain(quantity.problem);
          return;
        }
        const { value, upper, lower } = quantity;
        expect(Number.isFinite(value)).toBe(true);
        expect(upper === undefined).toBe(lower === undefined);
        for (const side of [upper, lower])
          if (side !== undefined) expect(side >= 0 && Number.isFinite(side)).toBe(true);
      }),
      { numRuns: 800 },
    );
  });

  test("is a header with a unit, with a problem, or with neither", () => {
    fc.assert(
      fc.property(garbage, (text) => {
        const { name, unit, problem } = readHeader(text);
        expect(typeof name).toBe("string");
        expect(unit !== undefined && problem !== undefined).toBe(false);
      }),
      { numRuns: 800 },
    );
  });
});
