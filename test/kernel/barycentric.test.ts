import { describe, expect, test } from "vitest";
import { barycentricSpeed } from "../../src/kernel/sky/barycentricSpeed.js";
import { barycentricTime } from "../../src/kernel/sky/barycentricTime.js";

const degree = Math.PI / 180;
const year = 31557600;
const milliarcsecond = degree / 3600000;
const daysOf = (date: string) => Date.parse(`${date}Z`) / 86400000 - 10957.5;

// astropy 5.2.1, built-in ephemeris, UT1 - UTC = 0, no polar motion: c z_B [m/s], BJD_TDB - JD_UTC [d].
const published: readonly [number, number, number, string, number, number, number, number][] = [
  [-70.7345, -29.2584, 2400, "2010-03-05T06:00:00", 197, -30, 19557.9989, 0.0046840893],
  [-155.4747, 19.826, 4145, "2010-09-05T06:00:00", 197, -30, -19618.6194, -0.0030578934],
  [5.7122, 43.9308, 650, "2015-07-01T02:00:00", 350, 10, 27884.8401, 0.002183639],
  [-17.889, 28.754, 2387, "2018-06-10T01:30:00", 285.679422, 50.241296, 6590.4224, 0.0020872031],
];

describe.each(published)("site %d %d, %d m, %s", (longitude, latitude, height, date, ra, dec, speed, days) => {
  const utc = daysOf(date);
  const place = [ra * degree, dec * degree, longitude * degree, latitude * degree, height] as const;

  test("the correction is right to 1 cm/s", () => {
    expect(Math.abs(barycentricSpeed(utc, ...place) - speed)).toBeLessThan(0.01);
  });

  test("the time is right to 1e-4 s", () => {
    expect(Math.abs(barycentricTime(utc, ...place) - utc - days) * 86400).toBeLessThan(1e-4);
  });

  test("longitude may be counted through 360 deg", () => {
    const round = [place[0], place[1], (longitude + (longitude < 0 ? 360 : -360)) * degree, place[3], height] as const;
    expect(Math.abs(barycentricSpeed(utc, ...round) - barycentricSpeed(utc, ...place))).toBeLessThan(1e-6);
  });
});

const site = [-1.2, -0.5, 2400] as const;

test("the correction is the rate at which the light time changes", () => {
  // Without the terms of relativity, which are worth 4.5 to 4.8 m/s (Wright & Eastman 2014).
  const step = 1e-3;
  for (const utc of [3716.75, 5000.3, 8800.1]) {
    const delay = (t: number) => barycentricTime(t, 3.4, -0.5, ...site) - t;
    const rate = (299792458 * (delay(utc + step) - delay(utc - step))) / (2 * step);
    const relativity = barycentricSpeed(utc, 3.4, -0.5, ...site) - rate;
    expect(relativity).toBeGreaterThan(4.3);
    expect(relativity).toBeLessThan(5.1);
  }
});

describe("the star's own motion", () => {
  const utc = daysOf("2026-01-01T00:00:00");
  const epoch = 2000 * year;
  const [ra, dec] = [269.452 * degree, 4.693 * degree];

  test("10.3577 arcsec a year at 546.98 mas: 4.5077 m/s a year of secular acceleration", () => {
    // mu^2 d by mpmath; Barnard's star, published as 4.50 m/s a year (Kuerster et al. 2003, from memory).
    const north = (10357.7 * milliarcsecond) / year;
    const moving = (parallax: number) => barycentricSpeed(utc, ra, dec, ...site, 0, north, parallax, epoch);
    // With a parallax the correction also takes out the acceleration since the epoch; the parallax itself turns the
    // direction by half an arcsecond, worth 0.1 m/s.
    const acceleration = (moving(0) - moving(546.98 * milliarcsecond)) / 26;
    expect(Math.abs(acceleration - 4.5077)).toBeLessThan(0.006);
  });

  test("a proper motion is a displacement since the epoch", () => {
    const shifted = barycentricSpeed(utc, ra, dec + 260 * 1000 * milliarcsecond, ...site);
    const north = (10000 * milliarcsecond) / year;
    // 26 Julian years after J2000.0 lie half a day beside midnight: 1e-3 yr at 0.15 m/s an arcsecond.
    const moved = barycentricSpeed(utc, ra, dec, ...site, 0, north, 0, epoch);
    expect(Math.abs(moved - shifted)).toBeLessThan(0.003);
    expect(Math.abs(moved - barycentricSpeed(utc, ra, dec, ...site))).toBeGreaterThan(1);
  });

  test("a proper motion in right ascension is taken times cos dec, as catalogues give it", () => {
    const east = (10000 * milliarcsecond) / year;
    const high = 60 * degree;
    const moved = barycentricSpeed(utc, ra, high, ...site, east, 0, 0, epoch);
    const shifted = barycentricSpeed(utc, ra + (260 * 1000 * milliarcsecond) / Math.cos(high), high, ...site);
    expect(Math.abs(moved - shifted)).toBeLessThan(0.01);
  });
});
