import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { airWavelength } from "../../src/kernel/airWavelength.js";
import { massFunction } from "../../src/kernel/massFunction.js";
import { orbitalPeriod } from "../../src/kernel/orbitalPeriod.js";
import { pixelShift } from "../../src/kernel/pixelShift.js";
import { pixelSpeed } from "../../src/kernel/pixelSpeed.js";
import { planetMass } from "../../src/kernel/planetMass.js";
import { planetShift } from "../../src/kernel/planetShift.js";
import { planetSpeed } from "../../src/kernel/planetSpeed.js";
import { reflexAmplitude } from "../../src/kernel/reflexAmplitude.js";
import { semiMajorAxis } from "../../src/kernel/semiMajorAxis.js";
import { shiftMass } from "../../src/kernel/shiftMass.js";
import { shiftOfSpeed } from "../../src/kernel/shiftOfSpeed.js";
import { speedOfShift } from "../../src/kernel/speedOfShift.js";
import { starAxis } from "../../src/kernel/starAxis.js";
import { starSpeed } from "../../src/kernel/starSpeed.js";
import { totalMass } from "../../src/kernel/totalMass.js";
import { vacuumWavelength } from "../../src/kernel/vacuumWavelength.js";
import { relativeError } from "./relativeError.js";

const c = 299792458;
const roundTrip = 1e-13;

const logarithmic = (low: number, high: number) =>
  fc.double({ min: Math.log(low), max: Math.log(high), noNaN: true }).map(Math.exp);
const period = logarithmic(1e4, 3e12);
const star = logarithmic(1e18, 1e22);
const ratio = logarithmic(1e-12, 1);
const eccentricity = fc.double({ min: 0, max: 0.9999, noNaN: true });
const inclination = fc.double({ min: 0.01, max: 3.13, noNaN: true });
const speed = fc
  .tuple(logarithmic(1e-6, 0.9 * c), fc.constantFrom(-1, 1))
  .map(([magnitude, direction]) => magnitude * direction);
const orbit = fc.tuple(period, star, ratio, eccentricity, inclination);
const growth = fc.double({ min: 1.001, max: 10, noNaN: true });

function holds<T>(values: fc.Arbitrary<T>, law: (value: T) => void): void {
  const property = fc.property(values, (value) => {
    law(value);
  });
  fc.assert(property, { numRuns: 500 });
}

function same(actual: number, expected: number, bound: number): void {
  expect(relativeError(actual, expected)).toBeLessThanOrEqual(bound);
}

describe("there and back", () => {
  test("mass to amplitude to mass", () =>
    holds(orbit, ([P, M, x, e, i]) =>
      same(planetMass(reflexAmplitude(P, M, x * M, e, i), P, M, e, i), x * M, roundTrip),
    ));

  test("mass to shift to mass", () =>
    holds(orbit, ([P, M, x, e, i]) => same(shiftMass(planetShift(P, M, x * M, e, i), P, M, e, i), x * M, roundTrip)));

  test("amplitude to mass to amplitude", () =>
    holds(fc.tuple(logarithmic(1e-3, 1e5), orbit), ([K, [P, M, , e, i]]) =>
      same(reflexAmplitude(P, M, planetMass(K, P, M, e, i), e, i), K, roundTrip),
    ));

  test("period to axis to period, and to total mass", () =>
    holds(orbit, ([P, M, x]) => {
      const axis = semiMajorAxis(P, M, x * M);
      same(orbitalPeriod(axis, M, x * M), P, roundTrip);
      same(totalMass(axis, P), M + x * M, roundTrip);
    }));

  test("speed to shift to speed", () => holds(speed, (v) => same(speedOfShift(shiftOfSpeed(v, 0), 0), v, roundTrip)));

  test("speed to linear shift to speed", () =>
    holds(speed, (v) => same(speedOfShift(shiftOfSpeed(v / 10, 1), 1), v / 10, roundTrip)));

  test("speed to pixels to speed", () =>
    holds(fc.tuple(speed, logarithmic(1e3, 1e6), logarithmic(1, 10)), ([v, R, s]) =>
      same(pixelSpeed(pixelShift(v, R, s), R, s), v, roundTrip),
    ));

  test("vacuum to air to vacuum", () =>
    holds(fc.tuple(fc.double({ min: 200.1e-9, max: 2500e-9, noNaN: true }), fc.constantFrom(0, 1)), ([wavelength, f]) =>
      same(vacuumWavelength(airWavelength(wavelength, f), f), wavelength, roundTrip),
    ));
});

describe("two bodies", () => {
  test("momenta balance and the two orbits add up to the relative one", () =>
    holds(orbit, ([P, M, x]) => {
      const m = x * M;
      same(m * planetSpeed(P, M, m), M * starSpeed(P, M, m), 1e-14);
      same(starAxis(P, M, m) + starAxis(P, m, M), semiMajorAxis(P, M, m), 1e-14);
      same(starSpeed(P, M, m), planetSpeed(P, m, M), 1e-14);
      same(2 * Math.PI * starAxis(P, M, m), starSpeed(P, M, m) * P, 1e-14);
    }));

  test("a circular orbit seen edge-on shows the whole speed of the star", () =>
    holds(orbit, ([P, M, x]) => same(reflexAmplitude(P, M, x * M, 0, Math.PI / 2), starSpeed(P, M, x * M), 1e-15)));

  test("the mass function is (m sin i)^3 / (M + m)^2", () =>
    holds(orbit, ([P, M, x, e, i]) => {
      const m = x * M;
      const projected = m * Math.sin(i);
      same(massFunction(reflexAmplitude(P, M, m, e, i), P, e), projected ** 3 / (M + m) ** 2, 1e-13);
    }));
});

describe("scaling", () => {
  test("eight times the period halves the amplitude and takes the axis four times as far", () =>
    holds(orbit, ([P, M, x, e, i]) => {
      same(reflexAmplitude(8 * P, M, x * M, e, i), reflexAmplitude(P, M, x * M, e, i) / 2, 1e-15);
      same(semiMajorAxis(8 * P, M, x * M), 4 * semiMajorAxis(P, M, x * M), 1e-15);
    }));

  test("eight times both masses doubles the amplitude", () =>
    holds(orbit, ([P, M, x, e, i]) =>
      same(reflexAmplitude(P, 8 * M, x * (8 * M), e, i), 2 * reflexAmplitude(P, M, x * M, e, i), 1e-15),
    ));

  test("an orbit and its mirror image cannot be told apart", () =>
    holds(orbit, ([P, M, x, e, i]) =>
      same(reflexAmplitude(P, M, x * M, e, Math.PI - i), reflexAmplitude(P, M, x * M, e, i), 1e-13),
    ));
});

describe("monotonic laws", () => {
  test("the amplitude grows with planet mass and eccentricity, falls with period and star mass", () =>
    holds(fc.tuple(orbit, growth), ([[P, M, x, e, i], more]) => {
      const amplitude = reflexAmplitude(P, M, x * M, e, i);
      expect(reflexAmplitude(P, M, more * x * M, e, i)).toBeGreaterThan(amplitude);
      expect(reflexAmplitude(more * P, M, x * M, e, i)).toBeLessThan(amplitude);
      expect(reflexAmplitude(P, more * M, x * M, e, i)).toBeLessThan(amplitude);
      expect(reflexAmplitude(P, M, x * M, 1 - (1 - e) / more, i)).toBeGreaterThan(amplitude);
    }));

  test("the mass grows with amplitude, period and star mass, falls with eccentricity", () =>
    holds(fc.tuple(orbit, growth), ([[P, M, x, e, i], more]) => {
      const K = reflexAmplitude(P, M, 0.01 * x * M, e, i);
      const mass = planetMass(K, P, M, e, i);
      expect(planetMass(more * K, P, M, e, i)).toBeGreaterThan(mass);
      expect(planetMass(K, more * P, M, e, i)).toBeGreaterThan(mass);
      expect(planetMass(K, P, more * M, e, i)).toBeGreaterThan(mass);
      expect(planetMass(K, P, M, 1 - (1 - e) / more, i)).toBeLessThan(mass);
      expect(planetMass(K, P, M, e, Math.PI / 2)).toBeLessThanOrEqual(mass);
    }));

  test("the mass exceeds that of a test particle by 2/3 of the mass ratio, to first order", () =>
    holds(fc.tuple(period, star, logarithmic(1e-6, 1e-4)), ([P, M, x]) => {
      const neglecting = Math.cbrt(massFunction(starSpeed(P, M, x * M), P, 0) * M * M);
      expect(x * M - neglecting).toBeGreaterThan(0);
      same(1 - neglecting / (x * M), (2 / 3) * x, 2 * x + 1e-8);
    }));

  test("the shift grows with speed and is above v/c for motion away, less than its size for motion towards", () =>
    holds(fc.tuple(logarithmic(1, 0.8 * c), fc.double({ min: 1.001, max: 1.2, noNaN: true })), ([v, more]) => {
      expect(shiftOfSpeed(more * v, 0)).toBeGreaterThan(shiftOfSpeed(v, 0));
      expect(shiftOfSpeed(v, 0)).toBeGreaterThan(v / c);
      expect(-shiftOfSpeed(-v, 0)).toBeLessThan(v / c);
    }));
});

describe("special relativity", () => {
  test("shifts multiply where speeds add by Einstein's rule", () =>
    holds(fc.tuple(speed, speed), ([v, w]) => {
      const both = (v + w) / (1 + (v / c) * (w / c));
      const stretch = (1 + shiftOfSpeed(v, 0)) * (1 + shiftOfSpeed(w, 0));
      same(1 + shiftOfSpeed(both, 0), stretch, roundTrip);
    }));

  test("approach undoes recession", () =>
    holds(speed, (v) => same((1 + shiftOfSpeed(v, 0)) * (1 + shiftOfSpeed(-v, 0)), 1, 1e-14)));
});
