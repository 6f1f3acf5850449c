import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { airmass, airmassAt, altitudeOfAirmass } from "../../src/kernel/night/airmass.js";
import { altitude, altitudeOf } from "../../src/kernel/night/altitude.js";
import { darkness, noonBefore, siderealRate } from "../../src/kernel/night/darkness.js";
import { hoursUp } from "../../src/kernel/night/hoursUp.js";
import { moonDistance } from "../../src/kernel/night/moonDistance.js";
import { moonLit } from "../../src/kernel/night/moonLit.js";
import { newOrientation, orientationAt, starOfDate } from "../../src/kernel/night/starOfDate.js";
import { sunDirection } from "../../src/kernel/night/sun.js";
import { upFor } from "../../src/kernel/night/upSpans.js";
import { readTable } from "./table.js";

const deg = Math.PI / 180;
const epoch = 2451545;
const astronomical = -18 * deg;

const vector = (declination: number) => Float64Array.of(Math.cos(declination), 0, Math.sin(declination));

// astropy 5.2.1 with its builtin ephemeris and Earth orientation; night.py stands beside the tables.
describe("places in the sky from 1975 to 2021, against astropy", () => {
  const rows = readTable(new URL("reference/night.csv", import.meta.url)).map((row) => {
    const [utc, ra, dec, lon, lat] = [row.utc, row.ra, row.dec, row.lon, row.lat].map(Number) as number[];
    return {
      time: utc! - epoch,
      place: [ra! * deg, dec! * deg, lon! * deg, lat! * deg] as const,
      altitude: Number(row.altitude),
      moonDistance: Number(row.moonDistance),
      lit: Number(row.lit),
      sunAltitude: Number(row.sunAltitude),
    };
  });
  const worst = (of: (row: (typeof rows)[number]) => number) => Math.max(...rows.map((row) => Math.abs(of(row))));

  test("there are many", () => expect(rows.length).toBe(120));

  test("altitudes to 0.01 deg", () => {
    expect(worst((row) => altitude(row.time, ...row.place) / deg - row.altitude)).toBeLessThan(0.01);
  });

  test("the Sun to 0.015 deg", () => {
    const orientation = newOrientation();
    const sun = new Float64Array(3);
    const error = worst(({ time, place, sunAltitude }) => {
      orientationAt(time, orientation);
      sunDirection(time, sun);
      return altitudeOf(sun, orientation.sidereal + place[2], place[3]) / deg - sunAltitude;
    });
    expect(error).toBeLessThan(0.015);
  });

  test("distances from the Moon to 0.1 deg", () => {
    expect(worst((row) => moonDistance(row.time, ...row.place) / deg - row.moonDistance)).toBeLessThan(0.1);
  });

  test("the lit part of the Moon to 0.003", () => {
    expect(worst((row) => moonLit(row.time) - row.lit)).toBeLessThan(0.003);
  });
});

describe("airmass by Young (1994)", () => {
  // Computed with mpmath from the published form: z = 60, 85 and 90 deg.
  test.each([
    [30, 1.99173076],
    [5, 10.0587],
    [0, 31.73],
  ])("at %i deg", (height, expected) => {
    const digits = String(expected).split(".")[1]!.length;
    expect(airmassAt(height * deg)).toBeCloseTo(expected, digits);
  });

  test("is 1 at the zenith and agrees with the secant law high up", () => {
    expect(airmassAt(Math.PI / 2)).toBeCloseTo(1, 6);
    for (const height of [40, 60, 80]) expect(airmassAt(height * deg) * Math.sin(height * deg)).toBeCloseTo(1, 2);
  });

  test("agrees with Kasten & Young 1989 to 0.5 % above 15 deg, refraction left aside", () => {
    // 1 / (cos z + 0.50572 (96.07995 - z)^-1.6364), Appl. Opt. 28, 4735 (coefficients from memory); z with refraction there.
    for (let z = 0; z <= 75; z += 5) {
      const other = 1 / (Math.cos(z * deg) + 0.50572 * (96.07995 - z) ** -1.6364);
      expect(Math.abs(airmassAt((90 - z) * deg) / other - 1)).toBeLessThan(0.005);
    }
  });

  test("has an inverse", () => {
    fc.assert(
      fc.property(fc.double({ min: 1.001, max: 31, noNaN: true }), (x) => {
        expect(Math.abs(airmassAt(altitudeOfAirmass(x)) / x - 1)).toBeLessThan(1e-12);
      }),
    );
    expect(altitudeOfAirmass(40)).toBe(0);
  });

  test("has no value below the horizon", () => {
    expect(airmassAt(-1e-9)).toBeNaN();
    // The south pole from the north.
    expect(airmass(9000, 0, -90 * deg, 0, 45 * deg)).toBeNaN();
  });
});

describe("darkness", () => {
  test("begins and ends when astropy has the Sun at -18 deg, to 5 s", () => {
    const rows = readTable(new URL("reference/twilight.csv", import.meta.url));
    expect(rows.length).toBe(12);
    for (const row of rows) {
      const [date, lon, lat] = [Number(row.date) - epoch, Number(row.lon) * deg, Number(row.lat) * deg];
      const spans = darkness(noonBefore(date, lon), lon, lat, astronomical);
      expect(spans).toHaveLength(1);
      expect(Math.abs(spans[0]!.from + epoch - Number(row.evening)) * 86400).toBeLessThan(5);
      expect(Math.abs(spans[0]!.to + epoch - Number(row.morning)) * 86400).toBeLessThan(5);
    }
  });

  test("does not come in a white night, nor end in the polar night", () => {
    // 2027-06-21 and 2027-12-21, far north.
    const [june, december] = [10032.5, 10215.5];
    expect(darkness(noonBefore(june, 0), 0, 69 * deg, astronomical)).toEqual([]);
    const noon = noonBefore(december, 0);
    expect(darkness(noon, 0, 88 * deg, astronomical)).toEqual([{ from: noon, to: noon + 1 }]);
  });

  test("belongs to the evening's date at the site, wherever the site counts its longitude from", () => {
    // A date reaches 24 h; noon at 90 deg east comes 6 h before that of Greenwich.
    expect(noonBefore(9999.5, 0)).toBe(10000);
    expect(noonBefore(10000.4, 0)).toBe(10000);
    expect(noonBefore(9999.5, 90 * deg)).toBeCloseTo(9999.75, 12);
    expect(noonBefore(9999.5, -70 * deg)).toBeCloseTo(noonBefore(9999.5, 290 * deg), 12);
  });
});

describe("hours up", () => {
  // 2 H0 / 15 deg x 0.99726956632908 h, computed with mpmath: latitude -29.2567 deg, above 30 deg.
  test.each([
    [-30, 9.33762047],
    [0, 7.31768404],
  ])("of declination %i", (declination, hours) => {
    const half = upFor(vector(declination * deg), -29.2567 * deg, 30 * deg);
    expect(((2 * (half as number)) / siderealRate) * 24).toBeCloseTo(hours, 7);
  });

  test("in words where a star never or always stands above", () => {
    expect(upFor(vector(80 * deg), -30 * deg, 30 * deg)).toBe("never");
    expect(upFor(vector(-85 * deg), -30 * deg, 20 * deg)).toBe("always");
    // At the pole every star keeps its height.
    expect(upFor(vector(40 * deg), Math.PI / 2, 30 * deg)).toBe("always");
    expect(upFor(vector(20 * deg), Math.PI / 2, 30 * deg)).toBe("never");
    // A star at the pole of the sky, too.
    expect(upFor(vector(Math.PI / 2), 40 * deg, 30 * deg)).toBe("always");
    expect(upFor(vector(Math.PI / 2), 20 * deg, 30 * deg)).toBe("never");
  });

  test("are counted on a minute grid to a minute or two", () => {
    const star = new Float64Array(3);
    const sun = new Float64Array(3);
    const orientation = newOrientation();
    fc.assert(
      fc.property(
        fc.integer({ min: 9862, max: 10226 }),
        fc.double({ min: 0, max: 360, noNaN: true }),
        fc.double({ min: -90, max: 90, noNaN: true }),
        fc.double({ min: -60, max: 60, noNaN: true }),
        fc.double({ min: 5, max: 60, noNaN: true }),
        (day, ra, dec, lat, lowest) => {
          const found = hoursUp(day - 0.5, ra * deg, dec * deg, 0, lat * deg, lowest * deg, astronomical);
          let minutes = 0;
          let dark = 0;
          for (let minute = 0; minute < 1440; minute++) {
            const time = day + minute / 1440;
            orientationAt(time, orientation);
            sunDirection(time, sun);
            if (altitudeOf(sun, orientation.sidereal, lat * deg) > astronomical) continue;
            dark++;
            starOfDate(ra * deg, dec * deg, orientation, star);
            if (altitudeOf(star, orientation.sidereal, lat * deg) > lowest * deg) minutes++;
          }
          if (Number.isNaN(found)) expect(dark).toBeLessThanOrEqual(15);
          else expect(Math.abs(found / 60 - minutes)).toBeLessThanOrEqual(3);
        },
      ),
      { numRuns: 25 },
    );
  });

  test("of a night that is never dark are none that could be told", () => {
    expect(hoursUp(10032.5, 0, 0, 0, 69 * deg, 30 * deg, astronomical)).toBeNaN();
    expect(hoursUp(10215.5, 0, 80 * deg, 0, 88 * deg, 30 * deg, astronomical)).toBeCloseTo(86400, 6);
    expect(hoursUp(10215.5, 0, -80 * deg, 0, 88 * deg, 30 * deg, astronomical)).toBe(0);
  });
});
