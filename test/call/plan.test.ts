import { describe, expect, test } from "vitest";
import { call, numberFrom } from "./door.js";

describe("the uncertainty of a whole number is that before it was made whole", () => {
  test("of visits: N ~ (sigma / K)^2, so that dN / N = 2 dK / K", () => {
    // 2 (5 x 3 / 2.5)^2 = 72: dN = 72 x 2 x 0.1 / 2.5.
    const [[visits, sigma]] = call("VISITS", "2.5 ± 0.1 m/s", "3 m/s", 5) as [[number, number]];
    expect(visits).toBe(72);
    expect(sigma).toBeCloseTo(5.76, 7);
    // And where the number itself is rounded up, (15 / 2.6)^2 x 2 = 66.57.
    const [[rounded, own]] = call("VISITS", "2.6 ± 0.1 m/s", "3 m/s", 5) as [[number, number]];
    expect(rounded).toBe(67);
    expect(own).toBeCloseTo((450 / 2.6 ** 2) * (0.2 / 2.6), 7);
  });

  test("of visits for a mass", () => {
    // N = 2 (sigma / K)^2 / (1/25 - 1/900) = 74.057: dN / N = 2 dK / K.
    const [[visits, sigma]] = call("MASSVISITS", "2.5 ± 0.1 m/s", "3 m/s", "1 solMass", "0.05 solMass", 5) as [
      [number, number],
    ];
    expect(visits).toBe(75);
    expect(sigma).toBeCloseTo((2.88 / (1 / 25 - 1 / 900)) * 0.08, 6);
  });
});

describe("a blank cell in a column", () => {
  test("of apertures or obstructions is one that was left out", () => {
    const both = call(
      "RVNOISE",
      "9 mag",
      "900 s",
      "0.9 m/s",
      "6 mag",
      "60 s",
      [[null], ["3.57 m"]],
      [[null], ["3.57 m"]],
    );
    expect(both[0]).toEqual(both[1]);
    expect(numberFrom("ELECTRONS", "9 mag", "V", "3.6 m", 0.05, "900 s", "90 nm", null)).toBe(
      numberFrom("ELECTRONS", "9 mag", "V", "3.6 m", 0.05, "900 s", "90 nm"),
    );
  });

  test("of eccentricities is a circle, which needs no omega", () => {
    expect(numberFrom("VISITS", "2.5 m/s", "3 m/s", 5, undefined, null)).toBe(72);
    // s = 0.8, omega = 90 deg: H = s^2 / (1 + s), N = 36 / H = 101.25.
    expect(numberFrom("VISITS", "2.5 m/s", "3 m/s", 5, "uniform", 0.6, "90 deg")).toBe(102);
  });
});
