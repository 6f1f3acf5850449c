import { describe, expect, test } from "vitest";
import { pixelSpeed } from "../../src/kernel/pixelSpeed.js";
import { planetMass } from "../../src/kernel/planetMass.js";
import { planetSpeed } from "../../src/kernel/planetSpeed.js";
import { reflexAmplitude } from "../../src/kernel/reflexAmplitude.js";
import { refractivity } from "../../src/kernel/refractivity.js";
import { shiftOfSpeed } from "../../src/kernel/shiftOfSpeed.js";
import { speedOfShift } from "../../src/kernel/speedOfShift.js";
import { kernels } from "./kernels.js";

const never = [Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];

/** The kernel's arguments, each usual, but for one. */
function withOne(inputs: (typeof kernels)[number]["inputs"], index: number, value: number): number[] {
  return inputs.map((input, other) => (other === index ? value : input.inside[0]));
}

describe.each(kernels)("$name", ({ scalar, inputs }) => {
  for (const [index, input] of inputs.entries()) {
    test.each(input.inside)(`gives a number at ${input.name} %d`, (value) => {
      expect(Number.isFinite(scalar(...withOne(inputs, index, value)))).toBe(true);
    });

    test.each([...input.outside, ...never])(`gives NaN at ${input.name} %d`, (value) => {
      expect(scalar(...withOne(inputs, index, value))).toBeNaN();
    });
  }
});

describe("results that have no double", () => {
  test.each([
    ["a speed that would reach that of light", planetSpeed(1, 1.3e26, 0)],
    ["an amplitude that would reach the speed of light", reflexAmplitude(1, 1.3e26, 1.3e26, 0.9, 1.5)],
    ["a shift in pixels that would need a speed above that of light", pixelSpeed(1e9, 1000, 1)],
    ["a shift in pixels that would need a speed of approach above that of light", pixelSpeed(-1e9, 1000, 1)],
    ["a shift so great that the speed rounds to that of light", speedOfShift(1e9, 0)],
    ["the linear model just above a tenth of the speed of light", shiftOfSpeed(29979246, 1)],
    ["the linear model just below minus a tenth of the speed of light", shiftOfSpeed(-29979246, 1)],
    ["the linear model just above a shift of 0.1", speedOfShift(0.1000001, 1)],
    ["the refractive index of air where none is given", refractivity(199.8e-9, 0)],
    ["the refractive index of air by no known formula", refractivity(500e-9, 2)],
  ])("%s is NaN", (_, value) => {
    expect(value).toBeNaN();
  });
});

test("the linear model holds up to a tenth of the speed of light", () => {
  for (const sign of [1, -1]) {
    expect(shiftOfSpeed(sign * 29979245.8, 1)).toBe(sign * 0.1);
    expect(speedOfShift(sign * 0.1, 1)).toBeCloseTo(sign * 29979245.8, 7);
  }
});

test.each([1e7, 1e8, 1e12, 1e40, -1 + 1e-7, -1 + 1e-9, -1 + 1e-12, -1 + 2 ** -53])(
  "no speed reaches that of light, however great the shift: %d",
  (shift) => {
    expect(Math.abs(speedOfShift(shift, 0))).not.toBeGreaterThanOrEqual(299792458);
  },
);

describe("the ends of the arithmetic range", () => {
  const ends = [1e-40, 1e40];

  test("no corner of the domain of the mass gives 0 or an infinity", () => {
    for (const period of ends) {
      for (const star of ends) {
        for (const inclination of [1e-40, 1.5]) {
          for (const amplitude of [1e-40, 2.9e8]) {
            const mass = planetMass(amplitude, period, star, 1 - 2 ** -53, inclination);
            expect(mass).toBeGreaterThan(1e-250);
            expect(mass).toBeLessThan(1e300);
          }
        }
      }
    }
  });

  test("no corner of the domain of the amplitude gives 0 or an infinity", () => {
    for (const period of ends) {
      for (const star of ends) {
        for (const planet of ends) {
          for (const inclination of [1e-40, 1.5]) {
            const amplitude = reflexAmplitude(period, star, planet, 1 - 2 ** -53, inclination);
            expect(Number.isNaN(amplitude) || (amplitude > 1e-250 && amplitude < 299792458)).toBe(true);
          }
        }
      }
    }
  });
});

test("no planet moves nothing and no amplitude weighs nothing", () => {
  expect(reflexAmplitude(3e8, 1.3e20, 0, 0.3, 1.2)).toBe(0);
  expect(planetMass(0, 3e8, 1.3e20, 0.3, 1.2)).toBe(0);
  expect(shiftOfSpeed(0, 0)).toBe(0);
  expect(speedOfShift(0, 0)).toBe(0);
});
