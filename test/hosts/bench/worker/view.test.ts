import { describe, expect, test } from "vitest";
import type { FilterCondition } from "../../../../src/hosts/bench/protocol/request.js";
import { area, at, type OpenTable, openTable } from "./openTable.js";

const table = (): OpenTable =>
  openTable([
    ["Target", "K [m/s]", "K err", "Period [d]", "Note"],
    ["HD 10", 12.4671, 0.213, 4332.589, "old"],
    ["HD 209458", 84.67, 0.7, 3.5247, null],
    ["GJ 876 b", "0.2 km/s", null, null, "5 m/s"],
    ["b Pic", null, null, 7890, "Old"],
  ]);

describe("windows", () => {
  test("formats, uncertainties, headers and blanks", async () => {
    const open = table();
    await open.service.act({ do: "format", sheet: 0, columns: [1], format: { kind: "plus-minus", digits: 2 } });
    await open.service.act({
      do: "format",
      sheet: 0,
      columns: [3],
      format: { kind: "fixed", decimals: 1, grouped: true },
    });
    const { cells, rows, version } = open.service.windowOf(0, 0, 6, 0, 4);
    expect([...rows]).toEqual([0, 1, 2, 3, 4, 5]);
    expect(version).toBe(open.state().version);
    expect(cells.map((row) => row.map(({ text }) => text))).toEqual([
      ["Target", "K [m/s]", "K err", "Period [d]"],
      // JCGM 100:2008, 7.2.6: the value to the places of its uncertainty.
      ["HD 10", "12.47 \u00b1 0.21", "0.213", "4,332.6"],
      ["HD 209458", "84.67 \u00b1 0.70", "0.7", "3.5"],
      ["GJ 876 b", "0.2 km/s", "", ""],
      ["b Pic", "", "", "7,890.0"],
      ["", "", "", ""],
    ]);
    expect(cells[1]!.map(({ is }) => is)).toEqual(["text", "number", "number", "number"]);
  });

  test("errors, formulas and what they spill", async () => {
    const open = openTable([
      ["P [d]", "M [solMass]", "m [earthMass]", "m err", "K [m/s]", "K err"],
      [10, 1, 5, 0.5, null, null],
      [10, -1, 5, 0.5, null, null],
    ]);
    await open.service.act({
      do: "type over",
      area: area("E2:E3"),
      place: at("E2"),
      text: "=BARY.REFLEX(A2,B2,C2:D2,,,A$1:D$1,E$1)",
    });
    const [good, bad] = open.service.windowOf(0, 1, 3, 4, 6).cells;
    expect(good).toMatchObject([
      { is: "number", hasFormula: true },
      { is: "number", spilled: true },
    ]);
    expect(bad![0]).toMatchObject({
      text: "#VALUE!",
      is: "error",
      hasFormula: true,
      message: "REFLEX: star mass is -1 solMass; it must be above 0, because a body has mass; for example 1.1 solMass.",
    });
    expect(open.state().problems).toBe(2);
    expect(open.state().sheets[0]!.columnStates[5]).toMatchObject({ sigmaOf: 4, derived: true });
    expect(open.service.nextProblem(at("A1"))).toEqual(at("E3"));
    expect(open.service.nextProblem(at("E3"))).toEqual(at("F3"));
    expect(open.service.nextProblem(at("F3"))).toEqual(at("E3"));
    expect(table().service.nextProblem(at("A1"))).toBeUndefined();
  });
});

describe("the state of columns", () => {
  test("units, quantities, uncertainties and problems", () => {
    const open = openTable([
      ["Target", "Period [d]", "K", "err K", "m [Mjupp]", "Star mass [d]", "T [K]", "e"],
      ["a", 1, 2, 3, 4, 5, 6, 0.1],
    ]);
    expect(open.state().sheets[0]).toMatchObject({ name: "Targets", rows: 2, columns: 8, visibleRows: 2, filter: [] });
    const states = open.state().sheets[0]!.columnStates;
    expect(states.map(({ name, unit }) => [name, unit])).toEqual([
      ["Target", ""],
      ["Period", "d"],
      ["K", ""],
      ["err K", ""],
      ["m", "Mjupp"],
      ["Star mass", "d"],
      ["T", "K"],
      ["e", ""],
    ]);
    expect(states.map(({ reading }) => reading)).toEqual([
      { is: "none", quantity: undefined },
      { is: "unit", unit: "d", kind: "duration", quantity: "period" },
      { is: "none", quantity: "K" },
      { is: "none", quantity: "K" },
      { is: "problem", message: '"Mjupp" is not a known unit; did you mean "Mjup" (jupiterMass)?' },
      {
        is: "problem",
        message:
          '"Star mass [d]" looks like mass of the star, a mass, but its unit d is a duration; correct the name or the unit.',
      },
      { is: "unit", unit: "K", kind: "temperature", quantity: undefined },
      { is: "none", quantity: "eccentricity" },
    ]);
    expect(states.map(({ sigmaOf }) => sigmaOf)).toEqual([
      undefined,
      undefined,
      undefined,
      2,
      ...Array(4).fill(undefined),
    ]);
    expect(states[2]!.sigmasTo).toBe(3);
  });
});

describe("filters", () => {
  const rowsFor = (conditions: readonly FilterCondition[]) => {
    const open = table();
    expect(open.service.filter(0, conditions)).toEqual({ is: "done" });
    return [...(open.service.visibleRows(0) ?? [])];
  };
  test.each<[string, number, FilterCondition["test"], string, readonly number[]]>([
    ["numbers in the column's unit", 1, ">", "50", [0, 2, 3]],
    ["a value of another unit is converted", 1, ">=", "0.1 km/s", [0, 3]],
    ["and so is a quantity text in a cell", 1, "=", "200", [0, 3]],
    ["durations", 3, "<", "1 yr", [0, 2]],
    ["texts, capitals ignored", 4, "=", "old", [0, 1, 4]],
    ["texts that differ, blanks among them", 4, "<>", "old", [0, 2, 3]],
    ["parts of texts", 0, "contains", "hd", [0, 1, 2]],
    ["blanks", 3, "blank", "", [0, 3]],
    ["no blanks", 3, "not blank", "", [0, 1, 2, 4]],
    ["errors", 3, "holds error", "", [0]],
  ])("%s", (_, column, test, text, rows) => {
    expect(rowsFor([{ column, test, text }])).toEqual(rows);
  });

  test("conditions hold together, among rows that were chosen", () => {
    expect(
      rowsFor([
        { column: 0, test: "contains", text: "HD" },
        { column: 1, test: "<", text: "50" },
      ]),
    ).toEqual([0, 1]);
    const open = table();
    open.service.filter(0, [{ column: 1, test: "not blank", text: "" }], Int32Array.of(2, 3, 4));
    expect([...open.service.visibleRows(0)!]).toEqual([0, 2, 3]);
    open.service.filter(0, []);
    expect(open.service.visibleRows(0)).toBeUndefined();
  });

  test.each<[number, FilterCondition["test"], string, string]>([
    [
      1,
      ">",
      "3 d",
      "filter: 3 d is a duration, and K is in m/s, a speed; type a value in m/s or in a unit that converts to it",
    ],
    [
      4,
      ">",
      "3 d",
      "filter: Note states no unit to compare 3 d with; type a plain number, or give the column its unit",
    ],
    [
      0,
      "<",
      "HD",
      'filter: Target < "HD" compares with a text that is no number; type a number, for example < 10, or choose "contains"',
    ],
  ])("column %i %s %s is refused", (column, test, text, message) => {
    const open = table();
    expect(open.service.filter(0, [{ column, test, text }])).toEqual({ is: "refused", message });
    expect(open.service.visibleRows(0)).toBeUndefined();
  });

  test("a filter follows its column and looks at new values", async () => {
    const open = table();
    open.service.filter(0, [{ column: 1, test: ">", text: "50" }]);
    await open.service.act({ do: "insert columns", sheet: 0, at: 0, count: 1 });
    expect(open.state().sheets[0]!.filter).toEqual([{ column: 2, test: ">", text: "50" }]);
    await open.type("C2", [["99"]]);
    expect([...open.service.visibleRows(0)!]).toEqual([0, 1, 2, 3]);
    await open.service.goTo(0);
    expect(open.state().sheets[0]!.filter).toEqual([{ column: 1, test: ">", text: "50" }]);
    await open.service.act({ do: "delete columns", sheet: 0, at: 1, count: 1 });
    expect(open.state().sheets[0]!.filter).toEqual([]);
  });

  test("windows show the rows in view, then the blank rows below", () => {
    const open = table();
    open.service.filter(0, [{ column: 0, test: "contains", text: "HD" }]);
    const { rows, cells } = open.service.windowOf(0, 1, 5, 0, 1);
    expect([...rows]).toEqual([1, 2, 5, 6]);
    expect(cells.map(([cell]) => cell!.text)).toEqual(["HD 10", "HD 209458", "", ""]);
    expect(open.state().sheets[0]!.visibleRows).toBe(3);
  });
});

describe("finding", () => {
  const options = { text: "old", matchCase: false, wholeCell: false, inFormulas: false };
  test("both ways, round the ends", () => {
    const open = table();
    expect(open.service.find(options, at("A1"), false)).toEqual(at("E2"));
    expect(open.service.find(options, at("E2"), false)).toEqual(at("E5"));
    expect(open.service.find(options, at("E5"), false)).toEqual(at("E2"));
    expect(open.service.find(options, at("E2"), true)).toEqual(at("E5"));
    expect(open.service.find({ ...options, matchCase: true }, at("E2"), false)).toEqual(at("E2"));
    expect(open.service.find({ ...options, text: "nothing" }, at("E2"), false)).toBeUndefined();
    open.service.filter(0, [{ column: 1, test: "blank", text: "" }]);
    expect(open.service.find(options, at("A1"), false)).toEqual(at("E5"));
  });

  test("on the other sheets too", async () => {
    const open = table();
    await open.service.act({ do: "add sheet", name: "Notes" });
    await open.service.act({ do: "type", place: at("B3", 1), texts: [["old one"]] });
    expect(open.service.find(options, at("E5"), false)).toEqual(at("B3", 1));
    expect(open.service.find(options, at("B3", 1), false)).toEqual(at("E2"));
    expect(open.service.find(options, at("E2"), true)).toEqual(at("B3", 1));
  });

  test.each<[string, string, "down" | "up" | "left" | "right", string]>([
    ["to the last filled cell", "A1", "down", "A5"],
    ["to the last before a blank", "C1", "down", "C3"],
    ["over blanks to the next filled", "D3", "down", "D5"],
    ["to the end of what is in use", "B4", "down", "B5"],
    ["up to the first", "A5", "up", "A1"],
    ["right", "A2", "right", "E2"],
    ["left over a blank", "E3", "left", "D3"],
    ["nowhere further", "A1", "up", "A1"],
  ])("an edge: %s", (_, from, toward, to) => {
    expect(table().service.edge(at(from), toward)).toEqual(at(to));
  });

  test.each<[string, string | undefined]>([
    ["B3", "B3:B3"],
    ["b2:c4", "B2:C4"],
    ["Targets!D2", "D2:D2"],
    ["D:D", "D1:D5"],
    ["HD209458", "A3:A3"],
    ["gj 876", "A4:A4"],
    ["pic", "A5:A5"],
    ["Period", "D1:D5"],
    ["quick", "C2:C2"],
    ["Elsewhere!B2", undefined],
    ["nowhere at all", undefined],
  ])("the place of %s is %s", async (text, expected) => {
    const open = table();
    await open.service.act({ do: "define name", name: "quick", text: "=C2", sheet: 0 });
    expect(open.service.placeOf(text, 0)).toEqual(expected && area(expected));
  });

  test("a selection is summed with what its additions lose", () => {
    const open = openTable([["x [m/s]"], [1e16], [1], [-1e16], ["a"], [null], [2]]);
    // Exact sum of the doubles 1e16, 1, -1e16 and 2.
    expect(open.service.summarise(area("A1:A9"))).toEqual({
      filled: 6,
      numbers: 4,
      errors: 0,
      sum: 3,
      mean: 0.75,
      least: -1e16,
      most: 1e16,
      unit: "m/s",
    });
    expect(open.service.summarise(area("A5"))).toMatchObject({
      filled: 1,
      numbers: 0,
      sum: 0,
      mean: 0,
      least: 0,
      most: 0,
    });
  });
});
