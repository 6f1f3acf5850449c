import { describe, expect, test } from "vitest";
import { isProblem } from "../../src/units/problem.js";
import { readUnit } from "../../src/units/readUnit.js";
import type { Unit } from "../../src/units/unit.js";
import { vounitText } from "../../src/units/vounitText.js";

function unit(text: string): Unit {
  const read = readUnit(text);
  if (isProblem(read)) throw new Error(text);
  return read;
}

/** IVOA VOUnits 1.1 (Recommendation 2023-12-15): tables of known units; section 2.5, quoted units. */
describe("a unit as VOUnits asks for it", () => {
  test.each([
    ["1", ""],
    ["d", "d"],
    ["km s-1", "km/s"],
    ["Msun", "solMass"],
    ["AU", "AU"],
    ["Mjup", "'jupiterMass'"],
    ["Mearth", "'earthMass'"],
    ["Rjup", "'jupiterRad'"],
    ["jupiterMass/yr", "'jupiterMass'/yr"],
    ["log(cm/s**2)", "log(cm/s**2)"],
    ["log(jupiterMass)", "log('jupiterMass')"],
    ["1.8E27kg", "1.8E27kg"],
    ["10**-7 W/m2", "10**-7W/m**2"],
    ["ppm", "'ppm'"],
    ["%", "%"],
    ["mmag", "mmag"],
    ["ke-", "'kelectron'"],
    ["Angstrom", "Angstrom"],
    ["micron", "'micron'"],
  ])("%s is %s", (written, expected) => {
    expect(vounitText(unit(written))).toBe(expected);
  });

  test.each(["d", "jupiterMass/yr", "log(jupiterMass)", "10**-7W/m**2", "ppm", "kg/m**3"])(
    "%s reads back as itself",
    (text) => {
      expect(unit(vounitText(unit(text)))).toEqual(unit(text));
    },
  );
});
