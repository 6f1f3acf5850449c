import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { events, eventTime } from "../../src/kernel/orbit/orbitalEvent.js";
import { radialVelocity } from "../../src/kernel/orbit/radialVelocity.js";

const degree = Math.PI / 180;
const day = 86400;
const code = (name: (typeof events)[number]) => events.indexOf(name);
const orbit = fc.record({
  period: fc.double({ min: 0.5, max: 500, noNaN: true }),
  eccentricity: fc.double({ min: 0, max: 0.9, noNaN: true }),
  omega: fc.double({ min: -Math.PI, max: 2 * Math.PI, noNaN: true }),
  after: fc.double({ min: -3000, max: 3000, noNaN: true }),
});

/** Where a function that rises or falls through 0 between two times is 0, by bisection. */
function rootBetween(f: (t: number) => number, from: number, to: number): number {
  let [low, high] = f(from) < 0 ? [from, to] : [to, from];
  for (let step = 0; step < 80; step++) {
    const middle = (low + high) / 2;
    if (f(middle) < 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

// Computed with 60 digits (mpmath): phases after transit.
test.each([
  ["occultation", 0.3, 0, 0.688081167609],
  ["rv-high", 0.013, 58, 0.755665932776],
  ["rv-low", 0.013, 58, 0.248647413999],
  ["occultation", 0.5171, 185.22, 0.186985952819],
] as const)("%s of an orbit of eccentricity %d, omega %d deg", (which, eccentricity, omega, phase) => {
  const time = eventTime(code(which), 0, 10 * day, 0, eccentricity, omega * degree, 1);
  expect(time / 10).toBeCloseTo(phase, 11);
});

describe("where the velocity says they are", () => {
  // V - gamma = K (cos(nu + omega) + e cos omega): at transit and occultation it is K e cos omega, falling and rising.
  test("transit and occultation", () => {
    fc.assert(
      fc.property(orbit, ({ period, eccentricity: e, omega, after }) => {
        const v = (t: number) => radialVelocity(t, period * day, 1, 0, e, omega, 0, 0) - e * Math.cos(omega);
        for (const [which, sign] of [
          ["transit", -1],
          ["occultation", 1],
        ] as const) {
          const t = eventTime(code(which), after, period * day, 0, e, omega, 1);
          const near = period * 1e-3 * (1 - e) ** 2;
          const root = rootBetween((time) => sign * v(time), t - near, t + near);
          expect(Math.abs(root - t)).toBeLessThan(1e-9 * period + 1e-9);
        }
      }),
      { numRuns: 100 },
    );
  });

  test("extremes and quadratures", () => {
    fc.assert(
      fc.property(orbit, ({ period, eccentricity: e, omega, after }) => {
        const v = (t: number) => radialVelocity(t, period * day, 1, 0, e, omega, 0, 0) - e * Math.cos(omega);
        const high = eventTime(code("rv-high"), after, period * day, 0, e, omega, 1);
        const low = eventTime(code("rv-low"), after, period * day, 0, e, omega, 1);
        expect(v(high)).toBeCloseTo(1, 8);
        expect(v(low)).toBeCloseTo(-1, 8);
        expect(eventTime(code("quadrature"), after, period * day, 0, e, omega, 1)).toBe(Math.min(high, low));
      }),
      { numRuns: 100 },
    );
  });

  test("periastron, where a time of periastron as reference gives the same curve", () => {
    fc.assert(
      fc.property(orbit, ({ period, eccentricity: e, omega, after }) => {
        const peri = eventTime(code("periastron"), after, period * day, 0, e, omega, 1);
        for (const phase of [0, 0.2, 0.6]) {
          const t = peri + phase * period;
          const byTransit = radialVelocity(t, period * day, 1, 0, e, omega, 0, 0);
          const byPeriastron = radialVelocity(t, period * day, 1, peri, e, omega, 0, 1);
          expect(Math.abs(byTransit - byPeriastron)).toBeLessThan(1e-7);
        }
      }),
      { numRuns: 100 },
    );
  });
});

describe("the next ones", () => {
  test("come after the instant, one period apart, and the event after an event is another", () => {
    fc.assert(
      fc.property(orbit, fc.constantFrom(...events.keys()), ({ period, eccentricity, omega, after }, which) => {
        const nth = (n: number, from = after) => eventTime(which, from, period * day, 0, eccentricity, omega, n);
        const first = nth(1);
        const apart = which === code("quadrature") ? nth(3) - first : nth(2) - first;
        expect(first).toBeGreaterThan(after);
        expect(first - after).toBeLessThanOrEqual(period * (1 + 1e-12) + 1e-9);
        expect(apart).toBeCloseTo(period, 8);
        expect(nth(1, first)).toBeCloseTo(nth(2), 9);
        expect(nth(1, first)).toBeGreaterThan(first + 1e-6 * period);
      }),
      { numRuns: 200 },
    );
  });

  test("of a transit: whole periods after the reference", () => {
    expect(eventTime(code("transit"), 0, 3 * day, -1000.5, 0, 90 * degree, 1)).toBe(-1000.5 + 3 * 334);
    expect(eventTime(code("transit"), 1.5, 3 * day, -1000.5, 0, 90 * degree, 1)).toBe(-1000.5 + 3 * 335);
  });
});
