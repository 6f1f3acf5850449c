import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import type { Cell } from "../../src/call/cell.js";
import { call, headerRow, numberFrom } from "./door.js";

// Planets as their discoverers published them; each row of the table names its source and how far it was verified.
const lines = readFileSync(new URL("../published/planets.csv", import.meta.url), "utf8")
  .split("\n")
  .filter((line) => line !== "" && !line.startsWith("#"));
const [names, ...rows] = lines.map((line) => line.split(",")) as [string[], ...string[][]];

const at = (header: string) => names.indexOf(header);
const cellOf = (row: readonly string[], header: string): Cell => {
  const text = row[at(header)]!;
  return text === "" ? null : Number(text);
};
const columnOf = (header: string, chosen = rows) => chosen.map((row) => [cellOf(row, header)]);
const headersOf = (...headers: string[]) => headerRow("A$1", ...headers);

const P = "Period [d]";
const e = "Eccentricity";
const K = "K [m/s]";
const M = "Star mass [solMass]";
const i = "Inclination [deg]";
const half = (header: string) => header.replace(/( \[|$)/, " half unit$1");

interface Planet {
  readonly name: string;
  readonly row: readonly string[];
  readonly mass: string;
}

const planets: Planet[] = rows.map((row) => ({
  name: row[0]!,
  row,
  mass: row[at("Mass [jupiterMass]")] === "" ? "Mass [earthMass]" : "Mass [jupiterMass]",
}));

/** How far half a unit of the last digit of each input moves the result, one input after the other, all against us. */
function roundingOf(name: string, row: readonly string[], inputs: readonly string[], result: string): number {
  const value = (header: string) => cellOf(row, header) ?? undefined;
  const headers = headersOf(...inputs);
  const plain = numberFrom(name, ...inputs.map(value), headers, result);
  return inputs
    .filter((header) => Number(cellOf(row, half(header))) > 0)
    .map((header) => {
      const moved = inputs.map((one) =>
        one === header ? Number(value(one)) - Number(cellOf(row, half(header))) : value(one),
      );
      return Math.abs(numberFrom(name, ...moved, headers, result) - plain);
    })
    .reduce((sum, part) => sum + part, 0);
}

describe("published planets through the door, with the headers of the file", () => {
  test("the file is read", () => {
    expect(rows.length).toBe(15);
    for (const header of [P, e, K, M, i]) {
      expect(at(header), header).toBeGreaterThan(0);
      expect(at(half(header)), half(header)).toBeGreaterThan(0);
    }
  });

  test.each(planets)("$name: mass from K", ({ row, mass }) => {
    const edgeOn = cellOf(row, i) === null;
    const [name, inputs] = edgeOn ? ["MINMASS", [K, P, M, e]] : ["PLANETMASS", [K, P, M, i, e]];
    const headers = headersOf(...(inputs as string[]));
    const values = (inputs as string[]).map((header) => cellOf(row, header));
    const found = numberFrom(name as string, ...values, headers, mass);
    const tolerance = roundingOf(name as string, row, inputs as string[], mass) + Number(cellOf(row, half(mass)));
    expect(Math.abs(found - Number(cellOf(row, mass)))).toBeLessThanOrEqual(tolerance);
  });

  // A blank inclination is left out: the printed mass is a minimum mass.
  test.each(planets)("$name: K from mass", ({ row, mass }) => {
    const inputs = [P, M, mass, e, i];
    const values = inputs.map((header) => cellOf(row, header) ?? undefined);
    const found = numberFrom("REFLEX", ...values, headersOf(...inputs), K);
    const tolerance = roundingOf("REFLEX", row, inputs, K) + Number(cellOf(row, half(K)));
    expect(Math.abs(found - Number(cellOf(row, K)))).toBeLessThanOrEqual(tolerance);
  });

  test("the whole column in one call gives the same bits", () => {
    const masses = call("MINMASS", ...[K, P, M, e].map((header) => columnOf(header)), headersOf(K, P, M, e));
    expect(masses).toHaveLength(rows.length);
    rows.forEach((row, index) => {
      const values = [K, P, M, e].map((header) => cellOf(row, header));
      expect(masses[index]![0]).toBe(numberFrom("MINMASS", ...values, headersOf(K, P, M, e)));
    });
  });

  test("a column with blank inclinations answers the rows that have one", () => {
    const inputs = [K, P, M, i, e];
    const masses = call("PLANETMASS", ...inputs.map((header) => columnOf(header)), headersOf(...inputs)).flat();
    rows.forEach((row, index) => {
      if (cellOf(row, i) === null) expect(masses[index]).toMatchObject({ code: "#N/A" });
      else expect(masses[index]).toBeTypeOf("number");
    });
  });
});

describe("the Sun, moved by its planets", () => {
  test.each<[string, string, number, number, string]>([
    ["4332.589 d", "1 jupiterMass", 12.45908, 5e-6, "computed: mpmath, from IAU 2015 B3"],
    ["365.25 d", "1 earthMass", 0.0894584, 5e-8, "computed: mpmath, from IAU 2015 B3"],
    ["10759.22 d", "95.16 earthMass", 2.7559, 5e-5, "computed: mpmath, from IAU 2015 B3"],
    ["11.86 yr", "1 jupiterMass", 12.5, 0.05, "about 12.5 m/s, common practice, no source"],
    ["1 yr", "1 earthMass", 0.09, 0.005, "about 0.09 m/s, common practice, no source"],
  ])("%s, %s: %d m/s", (period, planet, expected, tolerance) => {
    expect(Math.abs(numberFrom("REFLEX", period, "1 solMass", planet) - expected)).toBeLessThanOrEqual(tolerance);
  });

  test("an eccentric orbit, e = 0.0484", () => {
    // 12.47370 m/s; computed: mpmath, from IAU 2015 B3
    expect(numberFrom("REFLEX", "4332.589 d", "1 solMass", "1 jupiterMass", 0.0484)).toBeCloseTo(12.4737, 5);
  });

  test("a heavy companion counts in the total mass", () => {
    // 24.5709405590 jupiterMass; computed: mpmath, from IAU 2015 B3
    const mass = numberFrom("MINMASS", "4 km/s", "1.3 d", "1.2 solMass", 0);
    expect(Math.abs(mass / 24.570940559 - 1)).toBeLessThan(1e-10);
  });
});
