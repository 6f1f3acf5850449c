import { describe, expect, test } from "vitest";
import { describeReading } from "../../src/catalog/describeReading.js";

/** What is told of a text, by name. */
function told(text: string): Record<string, string> {
  const { lines, understood } = describeReading(text);
  expect(understood, text).toBe(true);
  return Object.fromEntries(lines.map((line) => [line.slice(0, 10).trim(), line.slice(10)]));
}

describe("what is understood", () => {
  test.each<[string, Record<string, string>]>([
    // SI brochure: the prefixes and the day; IVOA VOUnits 1.1: the spellings.
    ["km s-1", { unit: "km/s", kind: "a speed", "1 is": "1000 m/s" }],
    ["Period [d]", { column: "Period", unit: "d", kind: "a duration", "1 is": "86400 s" }],
    ["v (km/s)", { column: "v", unit: "km/s" }],
    ["2 d", { value: "2", unit: "d", "in SI": "172800 s" }],
    ["4.5(2) d", { value: "4.5", sigma: "0.2", unit: "d", "in SI": "388800 s" }],
    ["2 +0.5 -0.25 h", { value: "2", sigma: "+0.5 -0.25", "in SI": "7200 s" }],
    ["12.5 mag", { value: "12.5", unit: "mag", kind: "a magnitude" }],
    ["5 %", { value: "5", unit: "%", "in SI": "0.05" }],
    ["0.25", { value: "0.25", unit: "1", kind: "a plain number" }],
    // A scale of a power of ten belongs to the unit (IVOA VOUnits 1.1, section 2.6).
    ["10**3m", { unit: "10**3m", kind: "a length", "1 is": "1000 m" }],
    // JD 2451545.0 TDB is J2000.0 (IAU 1994 Resolution C7); 2000-01-01 noon is JD 2451545.0.
    ["2451546.5 BJD_TDB", { value: "2451546.5", unit: "BJD_TDB", kind: "an instant" }],
    ["2000-01-02T12:00:00", { value: "2000-01-02T12:00:00", unit: "JD_UTC", kind: "an instant" }],
  ])("%s", (text, expected) => {
    expect(told(text)).toMatchObject(expected);
  });

  test("an instant counts from J2000.0, and nothing is said of one of it", () => {
    expect(told("2451546.5 BJD_TDB")["in SI"]).toMatch(/^1\.5 d from J2000\.0/);
    expect(told("2000-01-02T12:00:00")["in SI"]).toMatch(/^1 d from J2000\.0/);
    expect(told("2000-01-02T12:00:00")["1 is"]).toBeUndefined();
  });
});

test.each([
  ["Mjupp", /^"Mjupp" is not a known unit; did you mean "Mjup" \(jupiterMass\)\?$/],
  ["4 MJ", /^"MJ" has more than one meaning; write "jupiterMass" \(Jupiter mass\) or .*megajoule/],
  ["Mass [MJ]", /"MJ" has more than one meaning; write "jupiterMass"/],
  ["Period", /^"Period" states no unit; write it in square brackets/],
  ["", /^"" states no unit/],
])("%s is not understood, in one sentence", (text, sentence) => {
  const { lines, understood } = describeReading(text);
  expect(understood).toBe(false);
  expect(lines).toEqual([expect.stringMatching(sentence)]);
});
