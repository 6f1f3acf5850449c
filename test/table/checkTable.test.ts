import { readFileSync } from "node:fs";
import Papa from "papaparse";
import { describe, expect, test } from "vitest";
import { type Cell, CellError } from "../../src/call/cell.js";
import { checksOf, sentencesOf } from "./tables.js";

function published(): Cell[][] {
  const text = readFileSync(new URL("../published/planets.csv", import.meta.url), "utf8");
  const lines = text.split("\n").filter((line) => line !== "" && !line.startsWith("#"));
  const { data } = Papa.parse<string[]>(lines.join("\n"));
  const numberOrText = (field: string) => (field === "" ? null : Number.isNaN(Number(field)) ? field : Number(field));
  return data.map((row, index) => (index === 0 ? row : row.map(numberOrText)));
}

describe("a clean table gives no alarm", () => {
  test("planets as their discoverers published them", () => {
    expect(published().length).toBe(16);
    expect(sentencesOf(published())).toEqual([]);
  });

  // Common practice, no source: headers as catalogues and observers write them.
  test.each<[string, Cell[][]]>([
    [
      "the Earth and Jupiter",
      [
        ["Planet", "P [yr]", "m [earthMass]", "a [AU]", "e"],
        ["Earth", 1, 1, 1, 0.0167],
        ["Jupiter", 11.86, 317.8, 5.2, 0.048],
      ],
    ],
    [
      "hot giants",
      [
        ["Name", "Per (days)", "Mp (Mjup)", "K (m/s)", "M* (Msun)", "inc (deg)"],
        ["x", 3.5, 0.69, 84.7, 1.12, 86.7],
        ["y", 2.2, 1.14, 201, 0.81, 85.6],
      ],
    ],
    [
      "a row of units",
      [
        ["Name", "P", "K", "Ms"],
        ["", "d", "m/s", "solMass"],
        ["x", 4.23, 55.9, 1.1],
      ],
    ],
    [
      "uncertainties beside",
      [
        ["P [d]", "P_err [d]", "K [m/s]", "\u03c3 K [m/s]", "Mass [Mearth]", "+- Mass"],
        [4.2, 0.1, 55, 1, 12, 3],
      ],
    ],
    [
      "upper and lower",
      [
        ["Period [d]", "Period err1 [d]", "Period err2 [d]"],
        [4.2, 0.1, -0.2],
      ],
    ],
    [
      "quantities that carry their units",
      [
        ["Period", "Planet mass"],
        ["4.23 d", "0.47 jupiterMass"],
        ["1 yr", "1 earthMass"],
      ],
    ],
    [
      "brightness and size",
      [
        ["Star", "V [mag]", "K [mag]", "R [solRad]", "Teff [K]", "[Fe/H]"],
        ["s", 5.4, 3.9, 1.1, 5790, 0.2],
      ],
    ],
    [
      "what is about a quantity",
      [
        ["Mass ratio", "Period flag", "Mass source", "Discovery year"],
        [0.001, 1, "RV", 1995],
        [0.1, 0, "TTV", 2001],
      ],
    ],
    ["radii without a unit", [["R"], [1.02], [0.9]]],
  ])("%s", (_, rows) => {
    expect(sentencesOf(rows)).toEqual([]);
  });
});

describe("planted faults are named", () => {
  test.each<[string, Cell[][], string[]]>([
    [
      // A median of 300 Jupiter masses is a star; 300 earthMass is 0.94 jupiterMass (IAU 2015 B3: 317.8 earthMass).
      "masses in another unit than the header says",
      [["Planet mass [jupiterMass]"], [226], [300], [763]],
      [
        '"Planet mass [jupiterMass]": the median is 300 jupiterMass, unusual for mass of the planet; as earthMass it would be usual. Is the unit earthMass?',
      ],
    ],
    [
      "no unit",
      [["Period"], [4.2]],
      ['"Period" looks like orbital period but states no unit; write for example "Period [d]".'],
    ],
    [
      "an unknown unit",
      [["Period [dayz]"], [4.2]],
      ['"Period [dayz]": "dayz" is not a known unit; did you mean "day" (d)?'],
    ],
    [
      "an ambiguous unit",
      [["Mass [M]"], [1]],
      [
        '"Mass [M]": "M" has more than one meaning; write "solMass" (solar mass), "jupiterMass" (Jupiter mass), "earthMass" (Earth mass) or "mag" (magnitude).',
      ],
    ],
    [
      "a unit of another kind",
      [["Period [AU]"], [1]],
      [
        '"Period [AU]" looks like orbital period, a duration, but its unit AU is a length; correct the name or the unit.',
      ],
    ],
    [
      "texts among numbers",
      [["K [m/s]"], [55.9], ["n/a"], [12], ["?"], [3]],
      [
        '"K [m/s]" holds 3 numbers and 2 texts that are none, first "n/a" in row 2; leave the cell blank or type a number.',
      ],
    ],
    [
      "a value outside the physics",
      [["Eccentricity"], [0.1], [1.08], [0.2]],
      ['"Eccentricity": 1 cell outside the range, first in row 2: 1.08 is not at least 0 and below 1.'],
    ],
    [
      "a zero mass",
      [["Star mass [solMass]"], [1], [0], [0.9]],
      ['"Star mass [solMass]": 1 cell outside the range, first in row 2: 0 solMass is not above 0.'],
    ],
    [
      "errors",
      [["K [m/s]"], [55], [new CellError("#N/A", "elsewhere", "not yet")], [3]],
      ['"K [m/s]" holds 1 error, first #N/A in row 2.'],
    ],
    [
      "an uncertainty without its value",
      [
        ["Remark", "Period sigma [d]"],
        ["faint", 0.1],
      ],
      [
        '"Period sigma [d]" looks like an uncertainty, but the column to its left is no value it could belong to; put it to the right of its value.',
      ],
    ],
    [
      "angles in radian that are said to be degrees",
      [["Inclination [deg]"], [1.5], [1.55], [1.4]],
      [
        '"Inclination [deg]": the median is 1.5 deg, unusual for angle between the orbit\'s axis and the line of sight; 90 deg is edge-on; as rad it would be usual. Is the unit rad?',
      ],
    ],
  ])("%s", (_, rows, expected) => {
    expect(sentencesOf(rows)).toEqual(expected);
  });

  test("what was understood is told of every column", () => {
    const checks = checksOf([
      ["Name", "Per [days]", "Mp [M_J]", "K", "Teff [K]"],
      ["x", 4.2, 0.5, 55, 5800],
    ]);
    expect(checks.map(({ recognised }) => [recognised.quantity?.name, recognised.unit?.text])).toEqual([
      [undefined, undefined],
      ["period", "d"],
      ["planet mass", "jupiterMass"],
      ["K", undefined],
      [undefined, "K"],
    ]);
    expect(checks[0]).toMatchObject({ numbers: 0, texts: 1, blanks: 0 });
  });
});
