import { describe, expect, test } from "vitest";
import { headerKeepsUnit, headerOfField } from "../../../src/files/table/headerOfField.js";
import { recogniseColumn } from "../../../src/table/recogniseColumn.js";

const notes = (name: string, unit?: string, ucd?: string) => ({ name, unit, ucd, description: undefined });

describe("the header of a column that a file describes in parts", () => {
  test.each([
    ["P", "d", undefined, "P [d]"],
    ["M", "Mjup", undefined, "M [jupiterMass]"],
    ["e", undefined, undefined, "e"],
    ["e", "1", undefined, "e"],
    ["f", "sloth/d", undefined, "f [sloth/d]"],
    ["[Fe/H]", "dex", undefined, "[Fe/H] [dex]"],
    // IVOA UCDList 1.5: stat.error, stat.error.max, stat.error.min.
    ["dM", "solMass", "stat.error;phys.mass", "dM sigma [solMass]"],
    ["dM", "solMass", "phys.mass;stat.error.max", "dM sigma+ [solMass]"],
    ["dM", "solMass", "phys.mass; STAT.ERROR.MIN", "dM sigma- [solMass]"],
    ["M_err", "solMass", "phys.mass;stat.error", "M_err [solMass]"],
    ["e_M", "solMass", "phys.mass;stat.error", "e_M [solMass]"],
    ["M", "solMass", "phys.mass;stat.errors", "M [solMass]"],
  ])("%s, %s, %s: %s", (name, unit, ucd, header) => {
    expect(headerOfField(notes(name, unit, ucd))).toBe(header);
    if (ucd && !ucd.includes("errors")) expect(recogniseColumn(header).isUncertainty).toBe(true);
  });

  // CDS, Standards for Astronomical Catalogues 2.0, section 3.3.2: e_X is the uncertainty of X, E_X and e_X the two sides.
  test.each(["e_Per", "E_Per"])("%s is recognised as an uncertainty", (name) => {
    expect(recogniseColumn(headerOfField(notes(name, "d")))).toMatchObject({
      isUncertainty: true,
      unit: { text: "d" },
    });
  });

  test.each([
    ["P", "d", true],
    ["f", "sloth", true],
    ["f", "sl]oth [", false],
  ])("%s in %s can be read from it: %s", (name, unit, keeps) => {
    expect(headerKeepsUnit(headerOfField(notes(name, unit)), notes(name, unit))).toBe(keeps);
  });
});
