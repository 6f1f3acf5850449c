import { describe, expect, test } from "vitest";
import { airWavelength } from "../../src/kernel/airWavelength.js";
import { lineShift } from "../../src/kernel/lineShift.js";
import { massFunction } from "../../src/kernel/massFunction.js";
import { orbitalPeriod } from "../../src/kernel/orbitalPeriod.js";
import { pixelShift } from "../../src/kernel/pixelShift.js";
import { pixelSpeed } from "../../src/kernel/pixelSpeed.js";
import { planetMass } from "../../src/kernel/planetMass.js";
import { planetShift } from "../../src/kernel/planetShift.js";
import { planetSpeed } from "../../src/kernel/planetSpeed.js";
import { reflexAmplitude } from "../../src/kernel/reflexAmplitude.js";
import { refractivity } from "../../src/kernel/refractivity.js";
import { semiMajorAxis } from "../../src/kernel/semiMajorAxis.js";
import { shiftMass } from "../../src/kernel/shiftMass.js";
import { shiftOfSpeed } from "../../src/kernel/shiftOfSpeed.js";
import { speedOfShift } from "../../src/kernel/speedOfShift.js";
import { starAxis } from "../../src/kernel/starAxis.js";
import { starSpeed } from "../../src/kernel/starSpeed.js";
import { totalMass } from "../../src/kernel/totalMass.js";
import { vacuumWavelength } from "../../src/kernel/vacuumWavelength.js";
import { relativeError } from "./relativeError.js";
import { type Row, readTable } from "./table.js";

/** The accuracy that the kernels' headers promise. */
const bound = 4e-15;

type Values = Record<string, number>;
type Check = readonly [column: string, kernel: (row: Values) => number];
const slow = 0.1 * 299792458;

const tables: Record<string, readonly Check[]> = {
  orbit: [
    ["semiMajorAxis", (r) => semiMajorAxis(r.period, r.starMass, r.planetMass)],
    ["starAxis", (r) => starAxis(r.period, r.starMass, r.planetMass)],
    ["planetSpeed", (r) => planetSpeed(r.period, r.starMass, r.planetMass)],
    ["starSpeed", (r) => starSpeed(r.period, r.starMass, r.planetMass)],
    ["orbitalPeriod", (r) => orbitalPeriod(r.axis, r.starMass, r.planetMass)],
    ["totalMass", (r) => totalMass(r.axis, r.period)],
  ],
  reflex: [
    ["reflexAmplitude", (r) => reflexAmplitude(r.period, r.starMass, r.planetMass, r.eccentricity, r.inclination)],
    ["planetShift", (r) => planetShift(r.period, r.starMass, r.planetMass, r.eccentricity, r.inclination)],
    ["planetMassOfAmplitude", (r) => planetMass(r.amplitude, r.period, r.starMass, r.eccentricity, r.inclination)],
    ["massFunction", (r) => massFunction(r.amplitude, r.period, r.eccentricity)],
    ["shiftMass", (r) => shiftMass(r.shift, r.period, r.starMass, r.eccentricity, r.inclination)],
  ],
  shift: [
    ["shiftOfSpeed", (r) => shiftOfSpeed(r.speed, 0)],
    ["speedOfShift", (r) => speedOfShift(r.shift, 0)],
    ["lineShift", (r) => lineShift(r.wavelength, r.speed, 0)],
    ["linearShift", (r) => (Math.abs(r.speed) < slow ? shiftOfSpeed(r.speed, 1) : r.linearShift)],
    ["pixelShift", (r) => pixelShift(r.speed, r.resolvingPower, r.pixelsPerElement)],
    ["pixelSpeed", (r) => pixelSpeed(r.pixels, r.resolvingPower, r.pixelsPerElement)],
  ],
  air: [
    ["refractivityCiddor1996", (r) => refractivity(r.wavelength, 0)],
    ["airCiddor1996", (r) => airWavelength(r.wavelength, 0)],
    ["vacuumCiddor1996", (r) => vacuumWavelength(r.wavelength, 0)],
    ["refractivityMorton2000", (r) => refractivity(r.wavelength, 1)],
    ["airMorton2000", (r) => airWavelength(r.wavelength, 1)],
    ["vacuumMorton2000", (r) => vacuumWavelength(r.wavelength, 1)],
  ],
};

const numbers = (row: Row): Values =>
  Object.fromEntries(Object.entries(row).map(([name, text]) => [name, Number(text)]));

// Expected values: mpmath at 50 to 80 digits at the doubles of each row; the script stands beside each table.
describe.each(Object.entries(tables))("%s.csv", (name, checks) => {
  const rows = readTable(new URL(`reference/${name}.csv`, import.meta.url)).map(numbers);

  test.each(checks)("%s", (column, kernel) => {
    expect(rows.length).toBeGreaterThan(250);
    for (const row of rows) {
      expect(relativeError(kernel(row), row[column]), JSON.stringify(row)).toBeLessThanOrEqual(bound);
    }
  });
});
