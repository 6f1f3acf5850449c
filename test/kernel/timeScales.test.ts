import { describe, expect, test } from "vitest";
import { leapSecondsKnownUntil, taiMinusUtc } from "../../src/kernel/time/leapSeconds.js";
import { tdbMinusTt, tdbOfTt, ttOfTai, ttOfTdb, ttOfUtc, utcOfTt } from "../../src/kernel/time/timeScales.js";
import { readTable } from "./table.js";

/** Days from J2000.0 of an ISO 8601 date by the machine's own calendar. */
const daysOf = (date: string) => Date.parse(`${date}Z`) / 86400000 - 10957.5;

describe("leap seconds", () => {
  // IERS, leap-seconds.list, updated through Bulletin C 70.
  test.each([
    ["1972-01-01T00:00:00", 10],
    ["1972-06-30T23:59:59", 10],
    ["1972-07-01T00:00:00", 11],
    ["1980-01-01T00:00:00", 19],
    ["1981-07-01T00:00:00", 20],
    ["1998-12-31T23:59:59", 31],
    ["1999-01-01T00:00:00", 32],
    ["2005-12-31T23:59:59", 32],
    ["2006-01-01T00:00:00", 33],
    ["2012-07-01T00:00:00", 35],
    ["2016-12-31T23:59:59", 36],
    ["2017-01-01T00:00:00", 37],
    ["2026-06-27T00:00:00", 37],
  ])("TAI - UTC at %s is %d s", (date, seconds) => {
    expect(taiMinusUtc(daysOf(date))).toBe(seconds);
  });

  test("none was told for after 28 June 2026, none before 1972 or from 2036 on", () => {
    expect(leapSecondsKnownUntil).toBe(daysOf("2026-06-28"));
    expect(taiMinusUtc(daysOf("2035-12-31"))).toBe(37);
    expect(taiMinusUtc(daysOf("1971-12-31"))).toBeNaN();
    expect(taiMinusUtc(daysOf("2036-01-01"))).toBeNaN();
    expect(taiMinusUtc(Number.NaN)).toBeNaN();
  });
});

describe("scales", () => {
  test("TT is 32.184 s ahead of TAI (IAU 1991) and 69.184 s of UTC since 2017", () => {
    expect((ttOfTai(9000) - 9000) * 86400).toBeCloseTo(32.184, 6);
    expect((ttOfUtc(9000) - 9000) * 86400).toBeCloseTo(69.184, 6);
  });

  test("there and back, also within a minute of a leap second", () => {
    const step = daysOf("2017-01-01");
    for (const utc of [-10227, 0, 9000, step - 2 / 86400, step - 1e-6, step, step + 2 / 86400, step + 40 / 86400]) {
      expect(Math.abs(utcOfTt(ttOfUtc(utc)) - utc) * 86400).toBeLessThan(1e-6);
      expect(Math.abs(ttOfTdb(tdbOfTt(utc)) - utc) * 86400).toBeLessThan(1e-6);
    }
  });

  // astropy 5.2.1: TDB - UTC 66.18544, 66.18256, 68.18411, 69.18467 s.
  test.each([
    ["2010-03-05T06:00:00", 0.00144],
    ["2010-09-05T06:00:00", -0.00144],
    ["2015-07-01T02:00:00", 0.00011],
    ["2018-06-10T01:30:00", 0.00067],
  ])("TDB - TT at %s", (date, seconds) => {
    expect(Math.abs(tdbMinusTt(ttOfUtc(daysOf(date))) - seconds)).toBeLessThan(2e-5);
  });

  test("TDB - TT is that of the full series to 1e-5 s", () => {
    // dtdb of ERFA (Fairhead & Bretagnon 1990); the script stands beside the table.
    for (const { days, tdb } of readTable(new URL("reference/earth.csv", import.meta.url))) {
      expect(Math.abs(tdbMinusTt(Number(days)) - Number(tdb)), days).toBeLessThan(1e-5);
    }
  });
});
