import { describe, expect, test } from "vitest";
import { radialVelocity } from "../../src/kernel/orbit/radialVelocity.js";

const degree = Math.PI / 180;
const day = 86400;
const transit = 0;
const periastron = 1;

interface Orbit {
  readonly period: number;
  readonly eccentricity: number;
  readonly omega: number;
}

/**
 * The star's velocity along the line of sight by integrating Newton's law for two bodies in their plane, with the
 * classical Runge-Kutta step of fourth order, from periastron on. Shares nothing with the code under test.
 * Units: the relative semi-major axis and GM of both are 1, so that the period is 2 pi; a thousandth of the mass is the
 * planet's. The x axis points to the ascending node of the star's orbit in the plane of the sky, y away from the
 * observer: an orbit seen edge-on.
 */
function integrated({ eccentricity: e, omega }: Orbit, steps: number, turns: number): number[] {
  const mass = 1e-3;
  // The star, seen from the planet, at periastron: at the angle omega from the node, moving across.
  const distance = 1 - e;
  const speed = Math.sqrt((1 + e) / (1 - e));
  let state = [
    distance * Math.cos(omega),
    distance * Math.sin(omega),
    -speed * Math.sin(omega),
    speed * Math.cos(omega),
  ];
  const rate = ([x, y, vx, vy]: number[]) => {
    const cube = Math.hypot(x!, y!) ** 3;
    return [vx!, vy!, -x! / cube, -y! / cube];
  };
  const plus = (a: number[], b: number[], h: number) => a.map((value, index) => value + h * b[index]!);
  const h = (2 * Math.PI * turns) / steps;
  const velocities: number[] = [];
  for (let step = 0; step <= steps; step++) {
    velocities.push(mass * state[3]!);
    const a = rate(state);
    const b = rate(plus(state, a, h / 2));
    const c = rate(plus(state, b, h / 2));
    const d = rate(plus(state, c, h));
    state = state.map((value, i) => value + (h / 6) * (a[i]! + 2 * b[i]! + 2 * c[i]! + d[i]!));
  }
  return velocities;
}

describe.each<Orbit>([
  { period: 4.2, eccentricity: 0, omega: 90 * degree },
  { period: 10, eccentricity: 0.3, omega: 360 * degree },
  { period: 100, eccentricity: 0.6, omega: 58 * degree },
  { period: 3.3, eccentricity: 0.7, omega: 200 * degree },
  { period: 900, eccentricity: 0.5, omega: 305 * degree },
])("an orbit of eccentricity $eccentricity, omega $omega", (orbit) => {
  const { period, eccentricity: e, omega } = orbit;
  const steps = 20000;
  const turns = 2;
  const expected = integrated(orbit, steps, turns);
  // K = (2 pi / P) a sin i m / M (1 - e^2)^(-1/2), here 1e-3 / (1 - e^2)^(1/2).
  const amplitude = 1e-3 / Math.sqrt(1 - e * e);

  test("moves its star as Newton's law does", () => {
    for (let step = 0; step <= steps; step += 97) {
      const time = (step / steps) * turns * period;
      const velocity = radialVelocity(1000 + time, period * day, amplitude, 1000, e, omega, 0, periastron);
      expect(Math.abs(velocity - expected[step]!), String(step)).toBeLessThan(amplitude * 1e-8);
    }
  });

  test("passes in front of its star at the reference time of a transit", () => {
    // The planet is nearest to the observer, the star farthest: y greatest, where y changes from growing to falling.
    const y = (time: number) => radialVelocity(time, period * day, 1, 0, e, omega, 0, transit);
    expect(Math.abs(y(0) - e * Math.cos(omega))).toBeLessThan(1e-12);
    expect(y(period * 1e-4)).toBeLessThan(y(0));
  });

  test("has its extremes gamma + K (e cos omega +- 1)", () => {
    const velocities = Array.from({ length: 40001 }, (_, n) =>
      radialVelocity((n / 40000) * period, period * day, 50, 0, e, omega, 1000, periastron),
    );
    expect(Math.max(...velocities)).toBeCloseTo(1000 + 50 * (e * Math.cos(omega) + 1), 3);
    expect(Math.min(...velocities)).toBeCloseTo(1000 + 50 * (e * Math.cos(omega) - 1), 3);
  });
});

test("a circular orbit approaches fastest a quarter of a period after transit", () => {
  const at = (phase: number) => radialVelocity(8 * phase, 8 * day, 3, 0, 0, 90 * degree, 0, transit);
  expect(at(0)).toBeCloseTo(0, 14);
  expect(at(0.25)).toBeCloseTo(-3, 14);
  expect(at(0.5)).toBeCloseTo(0, 14);
  expect(at(0.75)).toBeCloseTo(3, 14);
});
