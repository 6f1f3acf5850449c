import { describe, expect, test } from "vitest";
import { at, openTable } from "./openTable.js";

const set = (unit: string, convert: boolean, address = "B1") =>
  ({ do: "set unit", place: at(address), unit, convert }) as const;

describe("another unit, numbers converted", () => {
  test.each<[string, number, string, number, number, string]>([
    ["Period [d]", 1, "s", 86400, 0, "IVOA VOUnits 1.1: d = 86400 s"],
    ["Period [yr]", 1, "d", 365.25, 0, "IVOA VOUnits 1.1: yr = 365.25 d"],
    ["Axis [AU]", 1, "km", 149597870.7, 1e-15, "IAU 2012 Resolution B2: 149597870700 m"],
    ["K [km/s]", 0.05, "m/s", 50, 1e-15, "SI prefix"],
    ["lambda [nm]", 656.281, "Angstrom", 6562.81, 1e-15, "SI prefix; 1 Angstrom = 0.1 nm (VOUnits 1.1)"],
    ["i [deg]", 180, "rad", Math.PI, 1e-15, "definition of the degree"],
    [
      "Planet mass [jupiterMass]",
      1,
      "earthMass",
      1.2668653e17 / 3.986004e14,
      1e-14,
      "ratio of the nominal GM of IAU 2015 B3",
    ],
    [
      "Star mass [solMass]",
      1,
      "jupiterMass",
      1.3271244e20 / 1.2668653e17,
      1e-14,
      "ratio of the nominal GM of IAU 2015 B3",
    ],
    ["logg [log(cm/s2)]", 4.44, "log(m/s2)", 2.44, 1e-14, "1 m = 100 cm"],
  ])("%s %f to %s is %f (%#: %s)", async (header, value, unit, expected, tolerance) => {
    const table = openTable([
      ["Name", header],
      ["a", value],
    ]);
    expect(await table.service.act(set(unit, true))).toEqual({ is: "done" });
    const converted = table.cell("B2") as number;
    expect(Math.abs(converted - expected)).toBeLessThanOrEqual(tolerance * Math.abs(expected));
    expect(table.cell("B1")).toBe(header.replace(/\[.*\]/, `[${unit}]`));
    expect(table.state().history.labels.at(-1)).toMatch(
      new RegExp(`^set unit of .* to ${unit.replace(/[()]/g, "\\$&")}, values converted$`),
    );
  });

  test("uncertainties follow by the slope, texts with a unit of their own stay", async () => {
    const table = openTable([
      ["Name", "K [km/s]", "K err", "K err2 [km/s]"],
      ["a", 0.05, 0.001, 0.002],
      ["b", "12 m/s", null, "x"],
      ["c", "0.01 \u00b1 0.002", null, null],
    ]);
    await table.service.act(set("m/s", true));
    expect(["B2", "C2", "D2", "B3", "D3", "B4"].map((address) => table.cell(address))).toEqual([
      50,
      1,
      2,
      "12 m/s",
      "x",
      "10 \u00b1 2",
    ]);
    expect(["B1", "C1", "D1"].map((address) => table.cell(address))).toEqual(["K [m/s]", "K err", "K err2 [m/s]"]);
    await table.service.undo();
    expect(["B2", "C2", "D2", "B4"].map((address) => table.cell(address))).toEqual([
      0.05,
      0.001,
      0.002,
      "0.01 \u00b1 0.002",
    ]);
  });

  test("an uncertainty of a logarithm has the slope 1, in dex and in ln alike ln(10)", async () => {
    const table = openTable([
      ["Name", "logg [log(cm/s2)]", "logg err"],
      ["a", 4.44, 0.1],
    ]);
    await table.service.act(set("log(m/s2)", true));
    expect(table.cell("C2")).toBeCloseTo(0.1, 14);
  });

  test("formulas that read the header follow by themselves; others are told of", async () => {
    const table = openTable([
      ["P [d]", "M [solMass]", "m [jupiterMass]", "K [m/s]", "Half [m/s]"],
      [10, 1, 1, null, null],
    ]);
    await table.type("D2", [["=BARY.REFLEX(A2,B2,C2,,,A$1:C$1,D$1)", "=D2/2"]]);
    const before = table.cell("D2") as number;
    expect(await table.service.act(set("km/s", true, "D1"))).toEqual({ is: "done" });
    expect(table.cell("D2")).toBeCloseTo(before / 1000, 15);
    expect(await table.service.act(set("km/s", true, "E1"))).toEqual({
      is: "done",
      said: "1 formula cell of Half does not read the header and still gives m/s; change that formula too.",
    });
  });
});

describe("another unit, numbers kept", () => {
  test.each([
    ["Mass [jupiterMass]", "earthMass", "Mass [earthMass]"],
    ["Mass", "earthMass", "Mass [earthMass]"],
    ["K", "m/s", "K [m/s]"],
    ["K (km/s)", "m/s", "K (m/s)"],
    ["m [log] [d]", "h", "m [log] [h]"],
    ["Mass [Mjupp]", "jupiterMass", "Mass [jupiterMass]"],
    ["km/s", "m/s", "m/s"],
    ["", "d", "[d]"],
    ["Mass [jupiterMass]", "", "Mass"],
  ])("%j with %j becomes %j", async (header, unit, expected) => {
    const table = openTable([
      ["Name", header],
      ["a", 1.5],
    ]);
    expect((await table.service.act(set(unit, false))).is).toBe("done");
    expect(table.cell("B1")).toBe(expected);
    expect(table.cell("B2")).toBe(1.5);
  });
});
