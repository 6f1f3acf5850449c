import { readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { CellError } from "../../../src/call/cell.js";
import { displayCell } from "../../../src/sheet/display/displayCell.js";
import { displayMeasured } from "../../../src/sheet/display/displayMeasured.js";
import { displayNumber } from "../../../src/sheet/display/displayNumber.js";
import { parseFormat, printFormat } from "../../../src/sheet/display/formatText.js";
import type { MeasuredFormat, NumberFormat } from "../../../src/sheet/display/numberFormat.js";

const read = (file: string) =>
  readFileSync(new URL(file, import.meta.url), "utf8")
    .split("\n")
    .filter((line) => line.trim() !== "" && !line.startsWith("#"))
    .map((line) => line.split(" | ").map((field) => field.trim()) as [string, string, string, string]);

const format = (text: string) => {
  const found = parseFormat(text);
  if (!found) {
    throw new Error(`no format: ${text}`);
  }
  return found;
};

describe("numbers", () => {
  it.each(read("numbers.txt"))("%s as %s", (value, formatText, expected) => {
    expect(displayNumber(Number(value), format(formatText))).toBe(expected.slice(1, -1));
  });
});

describe("values with uncertainties", () => {
  it.each(read("measured.txt"))("%s as %s", (numbers, formatText, expected) => {
    const [value, upper, lower] = numbers.split(/\s+/).map(Number) as [number, number, number | undefined];
    expect(displayMeasured(value, upper, lower, format(formatText) as MeasuredFormat)).toBe(expected.slice(1, -1));
  });

  // JCGM 100:2008 section 7.2.6: the last digits of value and uncertainty stand in the same place.
  it("gives value and uncertainty the same places", () => {
    const number = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    const sigma = fc.double({ min: 1e-6, max: 1e4, noNaN: true });
    const places = (text: string) => text.split(".")[1]?.length ?? 0;
    fc.assert(
      fc.property(number, sigma, (value, size) => {
        const [first = "", second = ""] = displayMeasured(value, size, undefined, {
          kind: "plus-minus",
          digits: 2,
        }).split(" ± ");
        expect(places(first)).toBe(places(second));
        // Half a unit of the last of two digits is at most 5 % of the uncertainty.
        expect(Math.abs(Number(second) - size)).toBeLessThanOrEqual(0.05001 * size);
        expect(Math.abs(Number(first) - value)).toBeLessThanOrEqual(0.05001 * size + Math.abs(value) * 1e-15);
      }),
    );
  });
});

describe("format texts", () => {
  const formats: fc.Arbitrary<NumberFormat> = fc.oneof(
    fc.constantFrom<NumberFormat>({ kind: "general" }, { kind: "date" }),
    fc.record({
      kind: fc.constant("fixed" as const),
      decimals: fc.integer({ min: 0, max: 30 }),
      grouped: fc.boolean(),
    }),
    fc.record({ kind: fc.constant("percent" as const), decimals: fc.integer({ min: 0, max: 30 }) }),
    fc.record({
      kind: fc.constantFrom("time" as const, "date-time" as const),
      decimals: fc.integer({ min: 0, max: 9 }),
    }),
    fc.record({
      kind: fc.constantFrom("significant" as const, "scientific" as const),
      digits: fc.integer({ min: 1, max: 17 }),
    }),
    fc.record({
      kind: fc.constantFrom("plus-minus" as const, "brackets" as const),
      digits: fc.constantFrom(1 as const, 2 as const, 3 as const, 4 as const, "PDG" as const),
    }),
  );

  it("are read back as they were printed", () => {
    fc.assert(
      fc.property(formats, (each) => {
        expect(parseFormat(printFormat(each))).toEqual(each);
      }),
    );
  });

  it.each([
    "",
    "fixed x",
    "fixed 99",
    "general 2",
    "plus-minus 9",
    "fixed 2 grouped 3",
    "percent 1 grouped",
    "#,##0.00",
  ])("%s is none", (text) => expect(parseFormat(text)).toBeUndefined());
});

describe("cells", () => {
  it("that are no numbers keep their text", () => {
    const cells = ["x", true, null, new CellError("#N/A", "t", "m"), 1.5];
    expect(cells.map((cell) => displayCell(cell, format("fixed 2")))).toEqual(["x", "TRUE", "", "#N/A", "1.50"]);
  });
});

/** The decimal text is exact: reading it back misses by at most half a unit of its last place. */
it("rounds to nearest", () => {
  fc.assert(
    fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.integer({ min: 0, max: 6 }), (value, decimals) => {
      const shown = Number(displayNumber(value, { kind: "fixed", decimals, grouped: false }));
      expect(Math.abs(shown - value)).toBeLessThanOrEqual(0.5 * 10 ** -decimals + 1e-9);
    }),
  );
});
