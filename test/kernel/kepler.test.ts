import { expect, test } from "vitest";
import { anomaly } from "../../src/kernel/orbit/anomaly.js";
import { eccentricAnomaly } from "../../src/kernel/orbit/eccentricAnomaly.js";
import { phase } from "../../src/kernel/time/phase.js";
import { readTable } from "./table.js";

// Expected values: mpmath at 90 digits at the doubles of each row; the script stands beside the table.
const rows = readTable(new URL("reference/kepler.csv", import.meta.url)).map((row) =>
  Object.fromEntries(Object.entries(row).map(([name, text]) => [name, Number(text)])),
) as Record<"meanAnomaly" | "eccentricity" | "eccentricAnomaly" | "slope" | "sine" | "cosine", number>[];

/** The distance from a positive double to the next. */
function lastPlace(x: number): number {
  return Math.max(2 ** (Math.floor(Math.log2(x)) - 52), Number.MIN_VALUE);
}

test("Kepler's equation to four roundings of the mean anomaly", () => {
  expect(rows.length).toBe(510);
  for (const row of rows) {
    const { meanAnomaly: M, eccentricity, eccentricAnomaly: E } = row;
    const found = eccentricAnomaly(M, eccentricity);
    const allowed = 4 * lastPlace(M) * row.slope + lastPlace(E);
    expect(Math.abs(found - E), JSON.stringify(row)).toBeLessThanOrEqual(allowed);
    expect(eccentricAnomaly(-M, eccentricity)).toBe(-found);
  }
});

test("the true anomaly, as near as its eccentric one", () => {
  for (const row of rows) {
    const { meanAnomaly: M, eccentricity: e, eccentricAnomaly: E } = row;
    // Half the table's rows have periods that no orbit has; the angle is what counts here: one day is one radian.
    if (M < 1e-12 || e > 0.99999 || E > 3.1) continue;
    const nu = anomaly(M, 2 * Math.PI * 86400, 0, e, 0);
    // dnu/dE = (1 - e^2)^(1/2) / (1 - e cos E), and E is wrong by the rounding of M, which here was made twice more.
    const perE = Math.sqrt((1 - e) * (1 + e)) * row.slope;
    const allowed = perE * (12 * lastPlace(M) * row.slope + 4 * lastPlace(E)) + 1e-15;
    const expected = Math.atan2(row.sine, row.cosine);
    expect(Math.abs(nu - expected), JSON.stringify(row)).toBeLessThanOrEqual(allowed);
  }
});

// mpmath at 40 digits at the decimals as typed, whole turns of a period of 2 pi days.
test.each([
  [0.5, 1, 1.49870113351785, 2.03080621484916],
  [0.9, 0.1, 0.630843527563153, 1.9160557773452],
  [0.99, 1e-3, 0.088548596330182, 1.11716159548228],
  [0.99999, 1e-9, 9.99833418276238e-5, 0.044706350494739],
])("e = %d, M = %d", (eccentricity, mean, E, nu) => {
  const period = 2 * Math.PI * 86400;
  expect(eccentricAnomaly(mean, eccentricity)).toBeCloseTo(E, 13);
  expect(Math.abs(anomaly(mean, period, 0, eccentricity, 0) / nu - 1)).toBeLessThan(1e-10);
  expect(anomaly(mean, period, 0, eccentricity, 1)).toBeCloseTo(E, 11);
  expect(anomaly(mean, period, 0, eccentricity, 2)).toBeCloseTo(mean, 14);
  // Kepler's equation is odd, and angles are counted from 0 to 2 pi. What is left of a whole turn keeps 1e-16 of a turn, and
  // dnu/dM at periastron is ((1 + e) / (1 - e)^3)^(1/2).
  const steepest = Math.sqrt((1 + eccentricity) / (1 - eccentricity) ** 3);
  const found = anomaly(-mean, period, 0, eccentricity, 0);
  expect(Math.abs(found - (2 * Math.PI - nu))).toBeLessThan(1e-15 * steepest + 1e-14);
});

test("at apastron every anomaly is half a turn", () => {
  for (const which of [0, 1, 2]) expect(anomaly(2, 4 * 86400, 0, 0.7, which)).toBeCloseTo(Math.PI, 14);
});

test("no eccentricity and no mean anomaly is without a finite answer", () => {
  for (const e of [0, 1e-300, 0.5, 1 - 2 ** -30, 1 - 2 ** -53]) {
    for (let exponent = -320; exponent <= 0; exponent += 0.7) {
      const M = Math.PI * 10 ** exponent;
      const E = eccentricAnomaly(M, e);
      expect(E >= M * (1 - 1e-15) && E <= Math.PI * (1 + 1e-15), `${M} ${e} ${E}`).toBe(true);
    }
  }
});

test("a phase is counted from 0 up to but not including 1", () => {
  // 2459000.1 - 2451545 and 1/3 d in exact arithmetic; a double of this size is good to 1e-12 d.
  expect(phase(7455.1, 86400, 7455)).toBeCloseTo(0.1, 11);
  expect(phase(7454.9, 86400, 7455)).toBeCloseTo(0.9, 11);
  expect(phase(7455, 3 * 86400, 7455)).toBe(0);
  expect(phase(7455 - 1e-20, 3 * 86400, 7455)).toBe(0);
  for (const reference of [0, 1e-18, -1e-18, 5e-324]) {
    const value = phase(0, 86400, reference);
    expect(value >= 0 && value < 1, String(reference)).toBe(true);
  }
  expect(phase(9000, 1e-5, 0)).toBeNaN();
});
