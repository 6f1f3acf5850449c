import { describe, expect, test } from "vitest";
import { orbitCurve, type RowCell } from "../../src/table/orbitCurve.js";

const row = (cells: Readonly<Record<string, RowCell["cell"]>>): RowCell[] =>
  Object.entries(cells).map(([header, cell]) => ({ header, cell }));

describe("the curve of a row", () => {
  test("K alone: a circle, from the passage in front of the star, first towards the observer", () => {
    const curve = orbitCurve(row({ Target: "HD 1", "K [km/s]": 0.05 }));
    if (curve.is !== "curve") throw new Error(curve.message);
    expect(curve).toMatchObject({ unit: "km/s", amplitude: 0.05, period: undefined, reference: undefined });
    // v = -K sin(2 pi phase): the planet comes out from in front of the star moving away, so the star approaches.
    for (const index of [0, 100, 200, 300]) {
      expect(curve.velocities[index]).toBeCloseTo(-0.05 * Math.sin(2 * Math.PI * curve.phases[index]!), 12);
    }
    expect(curve.assumed).toEqual([
      "a circular orbit",
      "argument of periastron 90 deg",
      "phases from the passage in front of the star",
    ]);
  });

  test("an eccentric orbit from its periastron", () => {
    const curve = orbitCurve(
      row({ "Period [d]": 10, "K [m/s]": 100, e: 0.5, "omega [deg]": 60, "Tp [BJD_TDB]": 2459000.5 }),
    );
    if (curve.is !== "curve") throw new Error(curve.message);
    expect(curve).toMatchObject({ period: 10, reference: { day: 2459000.5, frame: "BJD_TDB" }, assumed: [] });
    // At periastron K (1 + e) cos omega.
    expect(curve.velocities[0]).toBeCloseTo(100 * 1.5 * 0.5, 10);
  });

  test("from the masses where K is not there", () => {
    const curve = orbitCurve(row({ "Period [d]": 4332.589, "Star mass [solMass]": 1, "Planet mass [jupiterMass]": 1 }));
    // 12.459080091688 m/s: 40 decimal digits, nominal GM of IAU 2015 B3.
    expect(curve).toMatchObject({ is: "curve", unit: "m/s", amplitude: expect.closeTo(12.459080091688, 10) });
    expect(curve.is === "curve" && curve.assumed[0]).toBe("K as REFLEX gives it");
  });

  test.each<[Record<string, RowCell["cell"]>, string]>([
    [
      { "Period [d]": 10, "K [m/s]": null },
      'This curve needs K, for example in a column "K [m/s]", or what K follows from; there is no star mass, planet mass in this row.',
    ],
    [
      { "K [m/s]": -3, "Period [d]": 0 },
      'This curve needs K, for example in a column "K [m/s]", or what K follows from; there is no period, star mass, planet mass in this row.',
    ],
  ])("%j is not enough", (cells, message) => {
    expect(orbitCurve(row(cells))).toEqual({ is: "missing", message });
  });
});
