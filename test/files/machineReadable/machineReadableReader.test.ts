import { describe, expect, test } from "vitest";
import { catalogueUnit } from "../../../src/files/machineReadable/catalogueUnit.js";
import { readExplanation } from "../../../src/files/machineReadable/explanation.js";
import { read, refusal, rowsOf, sentencesOf } from "../table/read.js";

/** CDS, Standards for Astronomical Catalogues, version 2.0, section 3.2; AAS machine-readable tables. Invented data. */
const table = `Title: Planets nobody has seen
Authors: Nobody A., Noone B.
Table: Orbits
================================================================================
Byte-by-byte Description of file: datafile1.txt
--------------------------------------------------------------------------------
   Bytes Format Units    Label   Explanations
--------------------------------------------------------------------------------
   1-  6 A6     ---      Name    Name of the star
   8- 13 F6.3   d        Per     [0/99]?=-9.999 Orbital period
  15- 18 F4.2   jovMass  Mass    ?=--- Minimum mass, as
                                   fitted (1)
  20- 23 F4.2   jovMass  e_Mass  ? Uncertainty in Mass
      25 I1     ---      Flag    [0/3] Quality flag
  27- 30 F4.2   [cm/s2]  logg    Surface gravity
  32- 38 E7.1   ---      z       Shift
--------------------------------------------------------------------------------
Note (1): From the fit
    of all data.
--------------------------------------------------------------------------------
007     4.230 0.47 0.02 1 4.45 1.0D-07
A b    -9.999 ---       7 4.50 2.0E-07
long    1.5   1.00
--------- unlike
`;

describe("a machine-readable table", () => {
  const file = read(table);

  test("its units become ours and its labels the names", () => {
    expect(file.format).toBe("machine-readable");
    expect(file.header).toEqual([
      "Name",
      "Per [d]",
      "Mass [jupiterMass]",
      "e_Mass [jupiterMass]",
      "Flag",
      "logg [log(cm/s**2)]",
      "z",
    ]);
    expect(file.notes[2]!.description).toBe("Minimum mass, as fitted (1)");
    expect([file.name, file.description]).toEqual(["Orbits", "Planets nobody has seen"]);
    expect(file.remarks).toEqual(["Authors: Nobody A., Noone B.", "Note (1): From the fit of all data."]);
  });

  test("its cells lie where the bytes say, nulls are blank, text stays text", () => {
    expect(rowsOf(file)).toEqual([
      ["007", 4.23, 0.47, 0.02, 1, 4.45, 1e-7],
      ["A b", null, null, null, 7, 4.5, 2e-7],
      ["long", 1.5, 1, null, null, null, null],
      ["------", "-- unl", "ke", null, null, null, null],
    ]);
  });

  test("values beyond the limits that it states are told", () => {
    expect(sentencesOf(file)).toEqual([
      'Column "Flag" has 1 value beyond the limits [0/3] that the file states, first 7 in row 2.',
    ]);
  });

  test("a rule below the data closes them", () => {
    const closed = read(`${table}${"-".repeat(80)}\n`);
    expect(rowsOf(closed)).toEqual(rowsOf(file));
    expect([closed.remarks, sentencesOf(closed)]).toEqual([file.remarks, sentencesOf(file)]);
    expect(rowsOf(read(table.replace(/^007[\s\S]*/m, "")))).toEqual([]);
    const noted = read(table.replace("Note (1)", "(1)"));
    expect([rowsOf(noted), noted.remarks]).toEqual([
      rowsOf(file),
      ["Authors: Nobody A., Noone B.", "(1): From the fit of all data."],
    ]);
  });

  test("text to the right of the last column is told", () => {
    const line = "007     4.230 0.47 0.02 1 4.45 1.0D-07 more\n";
    expect(sentencesOf(read(table.replace(/007.*\n/, line)))[0]).toBe(
      '1 line has text outside the columns that the header marks, first line 21: "more"; it was left aside.',
    );
  });
});

// CDS, Standards for Astronomical Catalogues 2.0, section 3.2.5.
test.each([
  ["Name", { description: "Name" }],
  ["? Mass", { description: "Mass" }],
  ["?=-9.9 Mass", { description: "Mass", nullText: "-9.9" }],
  ["?=- Flag", { description: "Flag", nullText: "-" }],
  [
    "[0/1]?=99 Eccentricity (2)",
    {
      description: "Eccentricity (2)",
      nullText: "99",
      limits: { text: "[0/1]", least: 0, most: 1, isLeastOpen: false, isMostOpen: false },
    },
  ],
  [
    "]0/[? Period",
    { description: "Period", limits: { text: "]0/[", least: 0, most: Infinity, isLeastOpen: true, isMostOpen: true } },
  ],
  ["[AB/C] Letter", { description: "Letter" }],
])("explanation %j", (text, expected) => {
  expect(readExplanation(text)).toEqual({ nullText: undefined, limits: undefined, ...expected });
});

// CDS, Units in Catalogues (section 3.2.3 of the same standard); VOUnits 1.1 on the right.
test.each([
  ["km/s", "km/s"],
  ["solMass", "solMass"],
  ["jovMass", "jupiterMass"],
  ["geoMass", "earthMass"],
  ["Rgeo", "earthRad"],
  ["[Sun]", "dex"],
  ["[cm/s2]", "log(cm/s**2)"],
  ["0.1nm", "0.1nm"],
  ["erg/s/cm2", "erg.s**-1.cm**-2"],
  ["10-7W/m2", "10**-7W/m**2"],
  ["arcs", "arcsec"],
  ["al", "lyr"],
  ["mag", "mag"],
  ['"h:m:s"', undefined],
  ["furlong", "furlong"],
  ["constructor", "constructor"],
])("unit %s", (written, ours) => {
  expect(catalogueUnit(written)).toBe(ours);
});

test.each([
  ["one that ends early", table.slice(0, 500), "its byte-by-byte description does not end with a rule of dashes"],
  [
    "one without entries",
    table.replace(/^ +\d.*\n/gm, ""),
    "its byte-by-byte description holds no entry that can be read",
  ],
  ["one without end", table.slice(0, 700) + "xx\n".repeat(600_000), "its byte-by-byte description has no end"],
  [
    "a guide to several files",
    table + table,
    "The file describes 2 tables byte by byte, whose data stand in files of their own",
  ],
])("%s is refused in a sentence", (_, text, reason) => {
  const message = refusal(text);
  expect(message).toContain(reason);
  expect(message.length).toBeLessThanOrEqual(250);
});
