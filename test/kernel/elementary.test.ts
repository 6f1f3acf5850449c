import { expect, test } from "vitest";
import { atan2, cos, sin } from "../../src/kernel/angle.js";
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

// Expected values: mpmath at 50 digits; the script stands beside the table.
test("sine, cosine and arc tangent of any angle", () => {
  const angles = readTable(new URL("reference/angle.csv", import.meta.url));
  expect(angles.length).toBe(269);
  for (const row of angles) {
    const angle = Number(row.angle);
    expect(Math.abs(sin(angle) - Number(row.sine)), row.angle).toBeLessThanOrEqual(1.7e-16);
    expect(Math.abs(cos(angle) - Number(row.cosine)), row.angle).toBeLessThanOrEqual(1.7e-16);
    if (Math.abs(angle) < 1) expect(relativeError(sin(angle), Number(row.sine))).toBeLessThanOrEqual(2.5e-16);
    const found = atan2(Number(row.y), Number(row.x));
    expect(Math.abs(found - Number(row.arcTangent)), `${row.y} ${row.x}`).toBeLessThanOrEqual(4.5e-16);
  }
});

test.each([
  [0, 0, 0],
  [0, -1, Math.PI],
  [1, 0, Math.PI / 2],
  [-1, 0, -Math.PI / 2],
  [-1, -1, -0.75 * Math.PI],
])("the direction (y, x) = (%d, %d) stands at %d", (y, x, angle) => {
  expect(atan2(y, x)).toBeCloseTo(angle, 15);
});
