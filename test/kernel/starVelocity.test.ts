import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { eccentricAnomaly } from "../../src/kernel/eccentricAnomaly.js";
import { conjunctionAnomaly, starVelocity } from "../../src/kernel/starVelocity.js";

const turn = 2 * Math.PI;

describe("Kepler's equation", () => {
  test("holds for what is returned", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 0.999, noNaN: true }),
        fc.double({ min: 0, max: turn, noNaN: true }),
        (e, mean) => {
          const anomaly = eccentricAnomaly(mean, e);
          expect(Math.abs(anomaly - e * Math.sin(anomaly) - mean)).toBeLessThanOrEqual(4e-15);
        },
      ),
    );
  });
});

describe("the velocity of a star", () => {
  test("a circle is a cosine", () => {
    for (const mean of [0, 0.3, 2, 5]) expect(starVelocity(7, 0, 0.4, mean)).toBeCloseTo(7 * Math.cos(mean + 0.4), 12);
  });

  test("the extremes are K (e cos omega + 1) and K (e cos omega - 1), half their difference is K", () => {
    for (const [e, omega] of [
      [0.2, 1],
      [0.7, 4],
      [0.9, 2.5],
    ] as const) {
      const values = Array.from({ length: 200_000 }, (_, index) =>
        starVelocity(10, e, omega, (turn * index) / 200_000),
      );
      const [least, most] = values.reduce(([a, b], each) => [Math.min(a, each), Math.max(b, each)], [0, 0]);
      expect(most).toBeCloseTo(10 * (e * Math.cos(omega) + 1), 5);
      expect(least).toBeCloseTo(10 * (e * Math.cos(omega) - 1), 5);
      // Over a whole orbit the star comes back to where it was.
      expect(Math.abs(values.reduce((sum, each) => sum + each, 0) / values.length)).toBeLessThan(1e-9);
    }
  });

  test("in front of the star the velocity is that of true anomaly pi/2 - omega: K e cos omega", () => {
    for (const [e, omega] of [
      [0, 1],
      [0.3, 0.5],
      [0.6, 4],
      [0.95, 5.5],
    ] as const) {
      expect(starVelocity(10, e, omega, conjunctionAnomaly(e, omega))).toBeCloseTo(10 * e * Math.cos(omega), 9);
    }
  });
});
