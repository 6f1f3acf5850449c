import { describe, expect, test } from "vitest";
import { airWavelength } from "../../src/kernel/airWavelength.js";
import {
  astronomicalUnit,
  day,
  jovianMassParameter,
  julianYear,
  solarMassParameter,
  solarRadius,
  terrestrialMassParameter,
} from "../../src/kernel/constants.js";
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

/** What is computed, its value, the value expected, the relative tolerance, where the expected value comes from. */
type Rows = readonly (readonly [string, number, number, number, string])[];

const sun = solarMassParameter;
const jupiter = jovianMassParameter;
const earth = terrestrialMassParameter;
const au = astronomicalUnit;
const edgeOn = Math.PI / 2;
const jupiterPeriod = 4332.589 * day;
const siderealYear = 365.256363004 * day;
const nanometre = 1e-9;

const orbits: Rows = [
  ["axis, 365.25 d, no planet", semiMajorAxis(julianYear, sun, 0) / au, 0.999987409034049, 1e-14, "computed: mpmath"],
  ["axis, 365.25 d, Earth", semiMajorAxis(julianYear, sun, earth) / au, 0.999988410183557, 1e-14, "computed: mpmath"],
  [
    "axis, sidereal year, Earth",
    semiMajorAxis(siderealYear, sun, earth) / au,
    1.000000023985573,
    1e-14,
    "computed: mpmath",
  ],
  [
    "axis of the Earth",
    semiMajorAxis(siderealYear, sun, earth) / au,
    1.00000102,
    2e-6,
    "mean elements J2000: 1.00000102 au (from memory)",
  ],
  ["axis, Jupiter", semiMajorAxis(jupiterPeriod, sun, jupiter) / au, 5.20280444919465, 1e-14, "computed: mpmath"],
  [
    "axis of Jupiter",
    semiMajorAxis(jupiterPeriod, sun, jupiter) / au,
    5.2026,
    1e-4,
    "mean elements J2000: 5.2026 au (from memory)",
  ],
  ["period at 1 au", orbitalPeriod(au, sun, 0) / day, 365.256898384042, 1e-14, "computed: mpmath"],
  [
    "Gaussian year",
    orbitalPeriod(au, sun, 0) / day,
    (2 * Math.PI) / 0.01720209895,
    3e-10,
    "Gaussian constant, IAU 1976; rounding of nominal GM",
  ],
  [
    "mass from axis and period",
    totalMass(5.20280444919465 * au, jupiterPeriod),
    sun + jupiter,
    1e-14,
    "computed: mpmath",
  ],
  [
    "Sun's orbit due to Jupiter",
    starAxis(jupiterPeriod, sun, jupiter) / solarRadius,
    1.06695,
    3e-6,
    "computed: mpmath",
  ],
  ["Sun's speed due to Jupiter", starSpeed(jupiterPeriod, sun, jupiter), 12.45908, 1e-7, "computed: mpmath"],
  [
    "speed of the Earth",
    planetSpeed(siderealYear, sun, earth),
    29780,
    2e-4,
    "29.78 km/s, planetary fact sheets (from memory)",
  ],
  [
    "speed of Jupiter",
    planetSpeed(jupiterPeriod, sun, jupiter),
    13060,
    1e-3,
    "13.06 km/s, planetary fact sheets (from memory)",
  ],
];

const amplitudes: Rows = [
  ["Sun by Jupiter", reflexAmplitude(jupiterPeriod, sun, jupiter, 0, edgeOn), 12.45908, 1e-7, "computed: mpmath"],
  [
    "Sun by Jupiter",
    reflexAmplitude(jupiterPeriod, sun, jupiter, 0, edgeOn),
    12.5,
    5e-3,
    "about 12.5 m/s, common practice, no source",
  ],
  [
    "Sun by Jupiter, e 0.0484",
    reflexAmplitude(jupiterPeriod, sun, jupiter, 0.0484, edgeOn),
    12.4737,
    5e-7,
    "computed: mpmath",
  ],
  ["Sun by Earth", reflexAmplitude(julianYear, sun, earth, 0, edgeOn), 0.0894584, 3e-7, "computed: mpmath"],
  [
    "Sun by Earth",
    reflexAmplitude(julianYear, sun, earth, 0, edgeOn),
    0.09,
    1e-2,
    "0.09 m/s, common practice, no source",
  ],
  ["Sun by Saturn", reflexAmplitude(10759.22 * day, sun, 95.16 * earth, 0, edgeOn), 2.7559, 2e-5, "computed: mpmath"],
  // The total mass of the practical form is 1 solMass, so the star has what the planet leaves.
  [
    "per jupiterMass and year",
    reflexAmplitude(julianYear, sun - jupiter, jupiter, 0, edgeOn),
    28.4324740778828,
    1e-14,
    "computed: mpmath",
  ],
  [
    "per jupiterMass and year",
    reflexAmplitude(julianYear, sun - jupiter, jupiter, 0, edgeOn),
    28.4329,
    2e-5,
    "Lovis & Fischer 2010, eq. 14, with older constants",
  ],
  [
    "per earthMass and year",
    reflexAmplitude(julianYear, sun - earth, earth, 0, edgeOn),
    0.0894585678559,
    1e-12,
    "computed: mpmath",
  ],
  [
    "per earthMass and day",
    reflexAmplitude(day, sun - earth, earth, 0, edgeOn),
    0.639467803032,
    2e-12,
    "computed: mpmath",
  ],
];

const masses: Rows = [
  [
    "4.230785 d, 55.94 m/s",
    planetMass(55.94, 4.230785 * day, 1.09 * sun, 0.013, edgeOn) / jupiter,
    0.471576224415,
    2e-12,
    "computed: mpmath",
  ],
  [
    "1.3 d, 4 km/s",
    planetMass(4000, 1.3 * day, 1.2 * sun, 0, edgeOn) / jupiter,
    24.570940559,
    1e-10,
    "computed: mpmath",
  ],
  [
    "4.230785 d, 30 km/s",
    planetMass(30000, 4.230785 * day, sun, 0, edgeOn) / jupiter,
    279.506849198,
    4e-12,
    "computed: mpmath",
  ],
  [
    "mass function of a test particle, 55.94 m/s",
    Math.cbrt(massFunction(55.94, 4.230785 * day, 0.013) * (1.09 * sun) ** 2) / jupiter,
    0.471446430177,
    2e-12,
    "computed: mpmath",
  ],
  [
    "mass function of a test particle, 4 km/s",
    Math.cbrt(massFunction(4000, 1.3 * day, 0) * (1.2 * sun) ** 2) / jupiter,
    24.2558899,
    3e-9,
    "computed: mpmath",
  ],
];

const shifts: Rows = [
  ["1 m/s", shiftOfSpeed(1, 0), 3.3356409575447e-9, 1e-13, "computed: mpmath"],
  ["1 m/s, linear", shiftOfSpeed(1, 1), 3.33564095198152e-9, 1e-14, "computed: mpmath"],
  ["-30 km/s", shiftOfSpeed(-30000, 0), -1.00064222135195e-4, 1e-14, "computed: mpmath"],
  ["shift 1e-4", speedOfShift(1e-4, 0), 29977.7468377175, 1e-14, "computed: mpmath"],
  ["shift of a galaxy, z = 1", speedOfShift(1, 0), 0.6 * 299792458, 1e-15, "(4 - 1)/(4 + 1) of c, exactly"],
  ["0.8 c", shiftOfSpeed(0.8 * 299792458, 0), 2, 1e-14, "(1.8/0.2)^(1/2) - 1, exactly"],
  [
    "30 km/s, above linear by v^2/2c",
    (shiftOfSpeed(3e4, 0) - shiftOfSpeed(3e4, 1)) * 299792458,
    1.501,
    1e-3,
    "common practice, no source",
  ],
  ["500 nm, 1 m/s", lineShift(500 * nanometre, 1, 0), 1.66782047599e-6 * nanometre, 2e-9, "computed: mpmath, v/c"],
  ["500 nm, 1 m/s, linear", lineShift(500 * nanometre, 1, 1), 1.66782047599e-6 * nanometre, 1e-11, "computed: mpmath"],
  [
    "550 nm, 12.5 m/s, linear",
    lineShift(550 * nanometre, 12.5, 1),
    2.29325315e-5 * nanometre,
    3e-9,
    "computed: mpmath",
  ],
  [
    "speed of a pixel",
    pixelSpeed(1, 115000, 3.2),
    814.65341848,
    1e-11,
    "computed: mpmath; R of HARPS (ESO), 3.2 from memory",
  ],
  ["pixels of 1 m/s", pixelShift(1, 115000, 3.2), 1.22751587e-3, 3e-9, "computed: mpmath"],
  ["1 m/s on 15 um pixels", pixelShift(1, 115000, 3.2) * 15e-6, 18.4127e-9, 3e-6, "computed: mpmath"],
  [
    "Sun's shift due to Jupiter",
    planetShift(jupiterPeriod, sun, jupiter, 0, edgeOn),
    12.45908 / 299792458,
    2e-7,
    "computed: mpmath, v/c",
  ],
  [
    "and back",
    shiftMass(12.45908 / 299792458, jupiterPeriod, sun, 0, edgeOn) / jupiter,
    1,
    2e-7,
    "the mass that was put in",
  ],
];

const air: Rows = [
  ["500 nm to air, Ciddor", airWavelength(500 * nanometre, 0), 499.860551997 * nanometre, 2e-12, "computed: mpmath"],
  [
    "656.469 nm to air, Ciddor",
    airWavelength(656.469 * nanometre, 0),
    656.287700586 * nanometre,
    2e-12,
    "computed: mpmath",
  ],
  ["1000 nm to air, Ciddor", airWavelength(1000 * nanometre, 0), 999.725909015 * nanometre, 2e-12, "computed: mpmath"],
  [
    "656.281 nm to vacuum, Ciddor",
    vacuumWavelength(656.281 * nanometre, 0),
    656.462297613 * nanometre,
    2e-12,
    "computed: mpmath",
  ],
  ["500 nm to air, Morton", airWavelength(500 * nanometre, 1), 499.860552201 * nanometre, 2e-12, "computed: mpmath"],
  ["refractivity at 587.7 nm", refractivity(587.7 * nanometre, 0), 2.771726488e-4, 3e-10, "computed: mpmath"],
  // That line list takes air with 300 ppm of CO2 instead of 450 ppm, worth 2e-8 of the wavelength.
  [
    "sodium D2 to air",
    airWavelength(589.1583264 * nanometre, 0),
    588.9950954 * nanometre,
    2.5e-8,
    "NIST Atomic Spectra Database (from memory)",
  ],
  [
    "sodium D1 to vacuum",
    vacuumWavelength(589.5924237 * nanometre, 1),
    589.7558147 * nanometre,
    2.5e-8,
    "NIST Atomic Spectra Database (from memory)",
  ],
];

describe.each([
  ["orbits", orbits],
  ["amplitudes", amplitudes],
  ["masses", masses],
  ["shifts", shifts],
  ["air", air],
])("%s", (_, rows) => {
  test.each(rows)("%s: %d is %d to %d (%s)", (_, actual, expected, tolerance) => {
    expect(relativeError(actual, expected)).toBeLessThanOrEqual(tolerance);
  });
});
