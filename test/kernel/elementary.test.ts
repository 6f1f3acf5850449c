import { expect, test } from "vitest";
import { cubeRoot } from "../../src/kernel/cubeRoot.js";
import { sine } from "../../src/kernel/sine.js";
import { relativeError } from "./relativeError.js";
import { readTable } from "./table.js";

// Expected values: mpmath at 50 digits; the script stands beside the table. They round to a double, which may cost 1.1e-16.
const rows = readTable(new URL("reference/elementary.csv", import.meta.url));

test("cube roots", () => {
  expect(rows.length).toBe(601);
  for (const row of rows) {
    expect(relativeError(cubeRoot(Number(row.x)), Number(row.cubeRoot)), row.x).toBeLessThanOrEqual(2.3e-16);
  }
});

test("sines", () => {
  for (const row of rows) {
    expect(relativeError(sine(Number(row.angle)), Number(row.sine)), row.angle).toBeLessThanOrEqual(3e-16);
  }
});

test("the cube root of a perfect cube is exact", () => {
  for (let root = 1; root <= 200_000; root += 7) expect(cubeRoot(root ** 3)).toBe(root);
});

test("the sine of a right angle is 1", () => {
  expect(sine(Math.PI / 2)).toBe(1);
});

test.each([
  [Math.PI / 6, 0.5],
  [(5 * Math.PI) / 6, 0.5],
  [Math.PI / 4, Math.SQRT1_2],
  [1e-40, 1e-40],
])("the sine of %d is %d", (angle, expected) => {
  expect(relativeError(sine(angle), expected)).toBeLessThanOrEqual(2.3e-16);
});
