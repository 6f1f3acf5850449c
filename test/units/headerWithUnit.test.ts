import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { headerUnitSpan } from "../../src/units/headerUnitSpan.js";
import { headerWithUnit } from "../../src/units/headerWithUnit.js";
import { readHeader } from "../../src/units/readHeader.js";

describe("where a header states its unit", () => {
  test.each([
    ["Period [d]", "d"],
    ["Period [ d ] (orbital)", " d "],
    ["logg [log(cm/s2)]", "log(cm/s2)"],
    ["K (m/s)", "m/s"],
    ["km/s", "km/s"],
    ["[m/s]", "m/s"],
    ["Mass [Mjupp]", "Mjupp"],
    ["Name", undefined],
    ["", undefined],
  ])("%j", (header, unit) => {
    const span = headerUnitSpan(header);
    expect(span && header.slice(span.from, span.to)).toBe(unit);
  });
});

test("a header with another unit reads back as that unit and keeps its name", () => {
  const names = fc.stringMatching(/^[A-Za-z][A-Za-z_ ]{3,12}[a-z]$/);
  const units = fc.constantFrom("d", "m/s", "km.s**-1", "solMass", "log(cm/s**2)", "BJD_TDB");
  fc.assert(
    fc.property(names, units, units, (name, before, after) => {
      const header = headerWithUnit(`${name} [${before}]`, after);
      expect(readHeader(header)).toMatchObject({
        name: name.trim(),
        unit: { text: readHeader(`x [${after}]`).unit!.text },
      });
      expect(headerWithUnit(header, before)).toBe(`${name} [${before}]`);
    }),
  );
});
