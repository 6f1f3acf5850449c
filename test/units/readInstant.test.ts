import { describe, expect, test } from "vitest";
import { julianDateOfEpoch } from "../../src/units/readInstantUnit.js";
import { fromBase, toBase } from "../../src/units/unit.js";
import { convert, quantityOf, quantityProblemOf, unitOf } from "./unitsOf.js";

/** The Julian date of an ISO 8601 text. */
function julianDate(text: string): number {
  const { value, unit } = quantityOf(text);
  return fromBase(unitOf("JD_UTC"), toBase(unit!, value));
}

describe("ISO 8601 texts", () => {
  test.each<[string, number, string]>([
    ["2000-01-01T12:00:00", 2451545, "J2000.0: IERS Conventions 2010"],
    ["1858-11-17", 2400000.5, "zero of the modified Julian date: IERS, USNO"],
    ["1970-01-01T00:00:00Z", 2440587.5, "USNO Julian date converter (from memory)"],
    ["1972-01-01", 2441317.5, "MJD 41317: IERS list of leap seconds"],
    ["1999-01-01", 2451179.5, "MJD 51179: IERS list of leap seconds"],
    ["2006-01-01", 2453736.5, "MJD 53736: IERS list of leap seconds"],
    ["2017-01-01", 2457754.5, "MJD 57754: IERS list of leap seconds"],
    ["1957-10-04T19:26:24", 2436116.31, "Meeus 1998, example 7.a (from memory)"],
    ["1987-01-27", 2446822.5, "Meeus 1998, chapter 7 (from memory)"],
    ["1987-06-19T12:00", 2446966, "Meeus 1998, chapter 7 (from memory)"],
    ["1988-01-27", 2447187.5, "Meeus 1998, chapter 7 (from memory)"],
    ["1600-01-01", 2305447.5, "Meeus 1998, chapter 7 (from memory)"],
    ["1600-12-31", 2305812.5, "Meeus 1998, chapter 7 (from memory)"],
    ["0001-01-01", 1721425.5, "first day of the proleptic Gregorian calendar (from memory)"],
  ])("%s is JD %d (%s)", (text, expected) => {
    // Days from J2000.0 are exact for a date; the Julian date itself is good to 0.04 ms.
    expect(Math.abs(julianDate(text) - expected)).toBeLessThan(1e-9);
  });

  test("may have parts of a day, spaces, offsets and fractions", () => {
    const noon = julianDate("2010-03-05T12:00:00");
    expect(julianDate("2010-03-05 12:00")).toBe(noon);
    expect(julianDate("2010-03-05T12:00:00Z")).toBe(noon);
    expect(julianDate("2010-03-05T12:00:00 UTC")).toBe(noon);
    expect(julianDate("2010-03-05T14:00:00+02:00")).toBe(noon);
    expect(julianDate("2010-03-05T07:30:00-0430")).toBe(noon);
    expect(julianDate("2010-03-05T24:00:00")).toBe(julianDate("2010-03-06"));
    expect(quantityOf("2000-01-01T12:00:01.5").value * 86400).toBeCloseTo(1.5, 10);
    // The leap second at the end of 2016 (IERS Bulletin C 52) is the day's last; as a date it is the next midnight.
    expect(julianDate("2016-12-31T23:59:60Z")).toBe(julianDate("2017-01-01"));
  });

  test("are UTC, and neither another scale nor a duration", () => {
    expect(quantityOf("2010-03-05").unit).toMatchObject({ kind: "instant", frame: "JD_UTC" });
  });

  test.each([
    "2010-02-29",
    "2010-04-31",
    "2010-00-10",
    "2010-13-10",
    "2010-03-05T25:00",
    "2010-03-05T24:30",
    "2010-03-05T12:60",
    "2010-03-05T12:00:61",
    "2010-03-05T12:00:00+99:00",
    "2010-3-5",
    "05-03-2010",
    "2010/03/05",
  ])("%s is none", (text) => {
    expect(["not a number", "unknown unit"]).toContain(quantityProblemOf(text).problem);
  });

  test("2000 was a leap year and 1900 was not", () => {
    expect(julianDate("2000-02-29")).toBe(julianDate("2000-03-01") - 1);
    expect(quantityProblemOf("1900-02-29").problem).toBe("not a number");
  });
});

describe("units of an instant", () => {
  test.each([
    ["JD_UTC", "JD_UTC", 0],
    ["JD UTC", "JD_UTC", 0],
    ["BJD_TDB", "BJD_TDB", 0],
    ["HJD_UTC", "HJD_UTC", 0],
    ["MJD_UTC", "JD_UTC", 2400000.5],
    ["MJD_TDB", "JD_TDB", 2400000.5],
    ["BJD_TDB-2450000", "BJD_TDB", 2450000],
    ["BJD_TDB - 2454833", "BJD_TDB", 2454833],
    ["JD_UT1-2450000.5", "JD_UT1", 2450000.5],
  ])("%s counts in %s, from %d", (text, frame, zero) => {
    const unit = unitOf(text);
    expect(unit).toMatchObject({ kind: "instant", frame });
    expect(toBase(unit, 1000)).toBe(1000 + zero - julianDateOfEpoch);
  });

  test("J2000.0 is 0 in base units", () => {
    expect(toBase(unitOf("JD_TT"), 2451545)).toBe(0);
    expect(toBase(unitOf("MJD_TT"), 51544.5)).toBe(0);
  });

  test("change of zero", () => {
    expect(convert(55000, "MJD_UTC", "JD_UTC")).toBe(2455000.5);
    expect(convert(2455000.5, "JD_UTC", "MJD_UTC")).toBe(55000);
    expect(() => convert(55000, "MJD_UTC", "MJD_TT")).toThrow();
    expect(() => convert(2455000, "JD_TDB", "BJD_TDB")).toThrow();
  });

  // Without a time scale a date is uncertain by 69 s; each is refused with the scales that tables mean.
  test.each(["JD", "MJD", "BJD", "HJD"])("%s states no scale", (text) => {
    expect(() => unitOf(text)).toThrow("ambiguous");
  });
});
