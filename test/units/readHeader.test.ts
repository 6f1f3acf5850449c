import { describe, expect, test } from "vitest";
import { readHeader } from "../../src/units/readHeader.js";

describe("headers that state a unit", () => {
  test.each([
    // The promise: last square brackets, else a cell that is itself a unit, else round brackets that hold one.
    ["Period [d]", "Period", "d"],
    ["Period[d]", "Period", "d"],
    ["Period [days]", "Period", "d"],
    ["Period [ d ]", "Period", "d"],
    ["K [m/s] corrected", "K corrected", "m/s"],
    ["K (m/s) [km/s]", "K (m/s)", "km/s"],
    ["P [d] [h]", "P [d]", "h"],
    ["[Fe/H] [dex]", "[Fe/H]", "dex"],
    ["Mass [Mjup] (min)", "Mass (min)", "jupiterMass"],
    ["log g [log(cm/s**2)]", "log g", "log(cm/s**2)"],
    ["log g [[cm/s2]]", "log g", "log(cm/s**2)"],
    ["Eccentricity []", "Eccentricity", "1"],
    ["Eccentricity [-]", "Eccentricity", "1"],
    ["Eccentricity [1]", "Eccentricity", "1"],
    ["T0 [BJD_TDB-2450000]", "T0", "BJD_TDB-2450000"],
    ["Period\n[d]", "Period", "d"],
    ["Period (d)", "Period", "d"],
    ["Period(days)", "Period", "d"],
    ["K (m/s)", "K", "m/s"],
    ["K (km s-1)", "K", "km/s"],
    ["a (AU)", "a", "AU"],
    ["m (s)", "m", "s"],
    ["m sin i (Mjup)", "m sin i", "jupiterMass"],
    ["Transits (2) (d)", "Transits (2)", "d"],
    ["d", "", "d"],
    [" d ", "", "d"],
    ["[d]", "", "d"],
    ["(d)", "", "d"],
    ["m/s", "", "m/s"],
    ["km s-1", "", "km/s"],
    ["solMass", "", "solMass"],
    ["kg/(m.s)", "", "kg.m**-1.s**-1"],
    ["W/(m2 um)", "", "W.m**-2.um**-1"],
    ["log(cm/s**2)", "", "log(cm/s**2)"],
    ["[log(cm/s2)]", "", "log(cm/s**2)"],
    ["sqrt(m)", "", "m**(0.5)"],
    ["m**(3/2)", "", "m**(1.5)"],
    ["(m/s)**2", "", "m**2/s**2"],
    ["1", "", "1"],
    ["JD_UTC", "", "JD_UTC"],
  ])("%j", (text, name, unit) => {
    const reading = readHeader(text);
    expect(reading.problem).toBeUndefined();
    expect(reading.name).toBe(name);
    expect(reading.unit?.text).toBe(unit);
  });
});

describe("headers that state none", () => {
  test.each([
    "",
    " ",
    "Period",
    "P",
    "e",
    "ecc",
    "i",
    "Mp",
    "Planet",
    "Notes (see paper)",
    "Mass (min. 3)",
    "[Fe/H]",
    "T_eff",
    "#",
  ])("%j", (text) => {
    expect(readHeader(text)).toEqual({ name: text.trim(), unit: undefined, problem: undefined });
  });

  // A column named after one letter may be a unit as well: it is taken for one, and the kind tells.
  test.each([
    ["K", "temperature"],
    ["a", "duration"],
    ["m", "length"],
    ["h", "duration"],
  ])("%s is a unit by itself, %s", (text, kind) => {
    expect(readHeader(text).unit?.kind).toBe(kind);
  });
});

describe("headers whose unit cannot be read", () => {
  test.each([
    ["Period [dayz]", "Period", "unknown unit"],
    ["Mass [M]", "Mass", "ambiguous unit"],
    ["Radius (R)", "Radius", "ambiguous unit"],
    ["Time (JD)", "Time", "ambiguous unit"],
    ["Acceleration [m/s/s]", "Acceleration", "unit grammar"],
    ["Name [see notes]", "Name", "unknown unit"],
  ])("%s", (text, name, problem) => {
    const reading = readHeader(text);
    expect(reading.unit).toBeUndefined();
    expect(reading.name).toBe(name);
    expect(reading.problem?.problem).toBe(problem);
  });
});
