import { describe, expect, test } from "vitest";
import { columnOf } from "../../src/call/column.js";
import {
  eccentricity,
  minimumMass,
  period,
  planetMass,
  semiAmplitude,
  starMass,
} from "../../src/functions/quantities.js";
import { checkTable } from "../../src/table/checkTable.js";
import { recogniseColumn } from "../../src/table/recogniseColumn.js";
import { ucdOfQuantity } from "../../src/table/ucds.js";

/** IVOA UCDList (UCD1+ controlled vocabulary) 1.5: the words and what they mean. */
describe("a UCD tells what a column is where its name does not", () => {
  test.each([
    ["col3 [d]", "time.period", "period"],
    ["col3 [AU]", "phys.size.smajAxis;meta.main", "axis"],
    ["col3", "src.orbital.eccentricity", "eccentricity"],
    ["col3 [deg]", "SRC.ORBITAL.INCLINATION", "inclination"],
    ["col3 [km/s]", "spect.dopplerVeloc", "speed"],
    ["x [solMass]", "phys.mass", "star mass"],
    ["x [jupiterMass]", "phys.mass", "planet mass"],
    ["of the host [kg]", "phys.mass", "star mass"],
    ["col3 [nm]", "em.wl", "rest wavelength"],
  ])("%s, %s: %s", (header, ucd, name) => {
    expect(recogniseColumn(header).quantity).toBeUndefined();
    expect(recogniseColumn(header, undefined, ucd).quantity?.name).toBe(name);
  });

  test.each([
    ["a mass of nobody knows whom", "x [kg]", "phys.mass"],
    ["another kind than its unit", "x [kg]", "time.period"],
    ["a ratio of masses", "x", "phys.mass;arith.ratio"],
    ["the largest period", "x [d]", "time.period;stat.max"],
    ["a place on the sky", "x [deg]", "pos.eq.ra"],
    ["a word of the language", "x", "constructor"],
  ])("%s is no quantity of ours", (_, header, ucd) => {
    expect(recogniseColumn(header, undefined, ucd).quantity).toBeUndefined();
  });

  test("the name goes before the UCD", () => {
    expect(recogniseColumn("Period [d]", undefined, "em.wl").quantity?.name).toBe("period");
  });

  test.each(["phys.mass;stat.error", "stat.error;phys.mass", "phys.mass;stat.error.max"])(
    "%s marks an uncertainty",
    (ucd) => {
      expect(recogniseColumn("dM [solMass]", undefined, ucd)).toMatchObject({
        isUncertainty: true,
        quantity: { name: "star mass" },
      });
      expect(recogniseColumn("dM [solMass]").isUncertainty).toBe(false);
    },
  );

  test("a table is checked with them", () => {
    const column = columnOf([-1]);
    expect(checkTable([{ header: "x", ucd: "src.orbital.eccentricity", column }])[0]!.findings).toMatchObject([
      { about: "out of range" },
    ]);
    expect(checkTable([{ header: "x", column }])[0]!.findings).toEqual([]);
  });

  test.each([
    [period, "time.period"],
    [starMass, "phys.mass"],
    [planetMass, "phys.mass"],
    [minimumMass, undefined],
    [semiAmplitude, undefined],
    [eccentricity, "src.orbital.eccentricity"],
  ])("%o is written as %s", (quantity, ucd) => {
    expect(ucdOfQuantity(quantity, false)).toBe(ucd);
    expect(ucdOfQuantity(quantity, true)).toBe(ucd && `${ucd};stat.error`);
  });
});
