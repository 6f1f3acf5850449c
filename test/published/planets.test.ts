import { describe, expect, test } from "vitest";
import { day, jovianMassParameter, solarMassParameter, terrestrialMassParameter } from "../../src/kernel/constants.js";
import { massFunction } from "../../src/kernel/massFunction.js";
import { planetMass } from "../../src/kernel/planetMass.js";
import { reflexAmplitude } from "../../src/kernel/reflexAmplitude.js";
import { type Row, readTable } from "../kernel/table.js";

const degree = Math.PI / 180;

/** A printed value and half a unit of its last digit, both in SI units. */
interface Printed {
  readonly value: number;
  readonly half: number;
}

function printed(row: Row, name: string, unit: string, scale: number): Printed {
  const [column, halfColumn] =
    unit === "" ? [name, `${name} half unit`] : [`${name} [${unit}]`, `${name} half unit [${unit}]`];
  return { value: Number(row[column]) * scale, half: Number(row[halfColumn]) * scale };
}

function planetOf(row: Row) {
  const inJupiters = row["Mass [jupiterMass]"] !== "";
  return {
    name: row.Planet,
    period: printed(row, "Period", "d", day),
    eccentricity: printed(row, "Eccentricity", "", 1),
    amplitude: printed(row, "K", "m/s", 1),
    star: printed(row, "Star mass", "solMass", solarMassParameter),
    inclination:
      row["Inclination [deg]"] === "" ? { value: Math.PI / 2, half: 0 } : printed(row, "Inclination", "deg", degree),
    mass: inJupiters
      ? printed(row, "Mass", "jupiterMass", jovianMassParameter)
      : printed(row, "Mass", "earthMass", terrestrialMassParameter),
  };
}

/**
 * How far rounding of the printed inputs can move the mass, as a fraction of it: first order, by the logarithmic
 * derivatives of the mass function (x is the mass ratio), every rounding against us. To it comes the printed mass's own.
 */
function massTolerance({ period, eccentricity, amplitude, star, inclination, mass }: ReturnType<typeof planetOf>) {
  const x = mass.value / star.value;
  const part = ({ value, half }: Printed) => half / value;
  const e = eccentricity.value;
  const inputs =
    part(amplitude) +
    part(period) / 3 +
    ((2 / 3) * part(star)) / (1 + x) +
    (e / ((1 - e) * (1 + e))) * eccentricity.half +
    inclination.half / Math.abs(Math.tan(inclination.value));
  return (inputs * (1 + x)) / (1 + x / 3) + part(mass);
}

/** The same for the amplitude, which moves by (1 + x/3) / (1 + x) of what the mass moves by. */
function amplitudeTolerance(planet: ReturnType<typeof planetOf>) {
  const x = planet.mass.value / planet.star.value;
  return (massTolerance(planet) * (1 + x / 3)) / (1 + x);
}

const planets = readTable(new URL("planets.csv", import.meta.url)).map(planetOf);

describe("planets as their discoverers published them", () => {
  test("all are read", () => {
    expect(planets.length).toBe(15);
    for (const planet of planets) expect(massTolerance(planet), planet.name).toBeGreaterThan(0);
  });

  test.each(planets)("$name: mass from K", (planet) => {
    const { amplitude, period, star, eccentricity, inclination, mass } = planet;
    const found = planetMass(amplitude.value, period.value, star.value, eccentricity.value, inclination.value);
    expect(Math.abs(found / mass.value - 1)).toBeLessThanOrEqual(massTolerance(planet));
  });

  test.each(planets)("$name: K from mass", (planet) => {
    const { amplitude, period, star, eccentricity, inclination, mass } = planet;
    const found = reflexAmplitude(period.value, star.value, mass.value, eccentricity.value, inclination.value);
    expect(Math.abs(found / amplitude.value - 1)).toBeLessThanOrEqual(amplitudeTolerance(planet));
  });

  // What the rows above are worth: in most of them 2 % of the mass is far outside the rounding.
  test("a mass 2 % off would be noticed in most rows", () => {
    expect(planets.filter((planet) => massTolerance(planet) < 0.02).length).toBeGreaterThan(planets.length / 2);
  });
});

test("a heavy companion counts in the total mass", () => {
  // 1.3 d, 4 km/s, 1.2 solMass, circular: 24.5709405590 jupiterMass, computed: mpmath.
  const star = 1.2 * solarMassParameter;
  const exact = planetMass(4000, 1.3 * day, star, 0, Math.PI / 2) / jovianMassParameter;
  expect(Math.abs(exact / 24.570940559 - 1)).toBeLessThan(1e-10);
  const neglectingIt = Math.cbrt(massFunction(4000, 1.3 * day, 0) * star * star) / jovianMassParameter;
  expect(neglectingIt / exact - 1).toBeCloseTo(-0.0128, 4);
});
