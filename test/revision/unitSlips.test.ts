import { describe, expect, test } from "vitest";
import { columnOf } from "../../src/call/column.js";
import { unitSlips } from "../../src/revision/unitSlips.js";
import { isProblem } from "../../src/units/problem.js";
import { readUnit } from "../../src/units/readUnit.js";
import type { Unit } from "../../src/units/unit.js";

function unitOf(text: string): Unit {
  const unit = readUnit(text);
  if (isProblem(unit)) throw new Error(text);
  return unit;
}

/** The same numbers in every run: a linear congruence (Numerical Recipes, 3rd ed., ranqd1). */
function randomNumbers(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return (state + 0.5) / 4294967296;
  };
}

/** Normal deviates (Box and Muller 1958). */
function normals(seed: number): () => number {
  const random = randomNumbers(seed);
  return () => Math.sqrt(-2 * Math.log(random())) * Math.cos(2 * Math.PI * random());
}

/** A column, and what becomes of it when each value is revised by a factor of about `scatter`. */
function revision(rows: number, scatter: number, seed: number) {
  const normal = normals(seed);
  const before = Array.from({ length: rows }, () => Math.exp(1.5 * normal()));
  return { before, after: before.map((value) => value * Math.exp(scatter * normal())) };
}

// Ratios as the handbooks have them: IAU 2015 resolution B3 (nominal masses and radii; GM_J/GM_E 317.828, GM_S/GM_J
// 1047.566, GM_S/GM_E 332946, R_J/R_E 11.209), the Julian year of 365.25 d, 180/pi = 57.2958, and 4.74047 km/s for an
// astronomical unit a Julian year (IAU 2012 resolution B2).
const planted: readonly (readonly [string, number, string, boolean])[] = [
  ["jupiterMass", 317.828, "earthMass", false],
  ["earthMass", 1 / 317.828, "jupiterMass", false],
  ["jupiterMass", 1 / 1047.566, "solMass", false],
  ["solMass", 1047.566, "jupiterMass", false],
  ["solMass", 332946, "earthMass", false],
  ["earthMass", 317.828, "jupiterMass", true],
  ["jupiterRad", 11.209, "earthRad", false],
  ["yr", 365.25, "d", false],
  ["d", 1 / 365.25, "yr", false],
  ["d", 24, "h", false],
  ["m/s", 1e-3, "km/s", false],
  ["km/s", 1000, "m/s", false],
  ["rad", 57.29578, "deg", false],
  ["km/s", 1 / 4.74047, "AU/yr", false],
  ["AU/yr", 4.74047, "km/s", false],
];

describe("unit slips", () => {
  test.each(planted)("in a column of %s by %f look like %s", (unit, factor, other, isReversed) => {
    const { before, after } = revision(5000, 0.1, 11);
    const rows = [3, 1200, 4999];
    for (const row of rows) after[row]! *= factor;
    const found = unitSlips(unitOf(unit), columnOf(before), columnOf(after));
    expect(found.map((slip) => [slip.other.text, slip.isReversed, slip.isWhole, slip.rows])).toEqual([[other, isReversed, false, rows]]); // biome-ignore format: one value
    expect(found[0]!.factor / factor).toBeCloseTo(1, 5);
  });

  test.each(planted)("of a whole column of %s by %f look like %s", (unit, factor, other, isReversed) => {
    const { before, after } = revision(500, 0.1, 12);
    const found = unitSlips(unitOf(unit), columnOf(before), columnOf(after.map((value) => value * factor)));
    expect(found).toMatchObject([{ isReversed, isWhole: true }]);
    expect(found[0]!.other.text).toBe(other);
    expect(found[0]!.rows.length).toBe(500);
  });

  test("are all found among 5,000 rows, many at once", () => {
    const { before, after } = revision(5000, 0.15, 13);
    const random = randomNumbers(5);
    const rows = [...before.keys()].filter(() => random() < 0.02);
    for (const row of rows) after[row]! *= 317.828;
    const [slip, ...more] = unitSlips(unitOf("jupiterMass"), columnOf(before), columnOf(after));
    expect(more).toEqual([]);
    expect(slip!.rows).toEqual(rows);
    expect(rows.length).toBeGreaterThan(50);
  });

  test.each(["jupiterMass", "solMass", "d", "yr", "m/s", "km/s", "deg", "AU", "solRad", "1"])(
    "are not seen in 100 honest revisions of a column of %s",
    (unit) => {
      for (let seed = 0; seed < 100; seed++) {
        const scatter = [0.01, 0.05, 0.1, 0.2, 0.3][seed % 5]!;
        const { before, after } = revision(400, scatter, 1000 + seed);
        expect(unitSlips(unitOf(unit), columnOf(before), columnOf(after))).toEqual([]);
      }
    },
  );

  test("nor where one value alone was revised much", () => {
    expect(unitSlips(unitOf("jupiterMass"), columnOf([1, 2, 3]), columnOf([1, 2, 9]))).toEqual([]);
  });
});
