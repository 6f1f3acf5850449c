import { expect, test } from "vitest";
import { earthOrientation, newOrientation } from "../../src/kernel/sky/earthOrientation.js";
import { earthState } from "../../src/kernel/sky/earthState.js";
import { readTable } from "./table.js";

// Expected values: ERFA 2.0; the script stands beside the table.
const rows = readTable(new URL("reference/earth.csv", import.meta.url)).map((row) =>
  Object.fromEntries(Object.entries(row).map(([name, text]) => [name, Number(text)])),
);
const arcsec = Math.PI / 648000;
const distance = (a: readonly number[], b: readonly number[]) => Math.hypot(...a.map((x, axis) => x - b[axis]!));

test("the Earth's place and speed are those of epv00 to 1.4 km and 1.4 mm/s", () => {
  expect(rows.length).toBe(93);
  const out = new Float64Array(6);
  for (const { days, x, y, z, vx, vy, vz } of rows) {
    earthState(days!, out);
    expect(distance([...out.slice(0, 3)], [x!, y!, z!]), String(days)).toBeLessThan(1400);
    expect(distance([...out.slice(3)], [vx!, vy!, vz!]), String(days)).toBeLessThan(1.4e-3);
  }
});

test("the velocity is the rate of the place", () => {
  const [before, after, here] = [new Float64Array(6), new Float64Array(6), new Float64Array(6)];
  const step = 0.01;
  for (const days of [-9000.3, 0, 1234.5, 9700.7]) {
    earthState(days - step, before);
    earthState(days + step, after);
    earthState(days, here);
    for (let axis = 0; axis < 3; axis++) {
      const rate = (after[axis]! - before[axis]!) / (2 * step * 86400);
      expect(Math.abs(rate - here[axis + 3]!)).toBeLessThan(2e-3);
    }
  }
});

test("outside its years there is no Earth", () => {
  const out = new Float64Array(6);
  for (const days of [-10321, 13321, Number.NaN]) {
    earthState(days, out);
    expect([...out].every(Number.isNaN)).toBe(true);
  }
});

test("the axes of date are those of IAU 2006/2000A to 0.05 arcsec, and so is sidereal time", () => {
  const orientation = newOrientation();
  for (const row of rows) {
    earthOrientation(row.days!, row.days!, orientation);
    for (let i = 0; i < 3; i++) {
      const axis = [...orientation.axes.slice(3 * i, 3 * i + 3)];
      expect(distance(axis, [row[`m${i}0`]!, row[`m${i}1`]!, row[`m${i}2`]!])).toBeLessThan(0.05 * arcsec);
    }
    const turns = (orientation.sidereal - row.sidereal!) / (2 * Math.PI);
    expect(Math.abs(turns - Math.round(turns)) * 1296000, String(row.days)).toBeLessThan(0.05);
  }
});
