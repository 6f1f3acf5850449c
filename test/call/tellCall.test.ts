import { describe, expect, test } from "vitest";
import { CellError } from "../../src/call/cell.js";
import { tellCall } from "../../src/call/tellCall.js";
import { definitions } from "../../src/functions/definitions.js";
import { argumentOf, call, column, type Given, headerRow } from "./door.js";

function told(name: string, given: readonly Given[], row?: number) {
  return tellCall(definitions.find((definition) => definition.name === name)!, given.map(argumentOf), row);
}

const headers = headerRow("B$1", "Period [d]", "M* [solMass]", "Mass [jupiterMass]", "e", "i [deg]");

describe("one call told in full", () => {
  test("each input as it was read, in its unit and in the base unit", () => {
    const { inputs, result, unit } = told("REFLEX", [4.23, 1.1, "0.47 jupiterMass", null, undefined, headers, "km/s"]);
    expect(inputs.map(({ name, reading }) => [name, reading?.value, reading?.unit.text])).toEqual([
      ["period", 4.23, "d"],
      ["star mass", 1.1, "solMass"],
      ["planet mass", 0.47, "jupiterMass"],
      ["eccentricity", undefined, undefined],
      ["inclination", undefined, undefined],
    ]);
    // A day is 86400 s (SI brochure); GM of the Sun 1.3271244e20, of Jupiter 1.2668653e17 m3/s2 (IAU 2015 B3).
    expect(inputs[0]!.base).toMatchObject({ unit: "s" });
    expect(inputs[0]!.base!.value).toBeCloseTo(4.23 * 86400, 6);
    expect(inputs[1]!.base!.value / 1.3271244e20).toBeCloseTo(1.1, 12);
    expect(inputs[2]!.base!.value / 1.2668653e17).toBeCloseTo(0.47, 12);
    expect(inputs[1]!.base!.unit).toBe("m**3/s**2 (GM)");
    expect(inputs[0]!.header).toEqual({ text: "Period [d]", address: "B$1" });
    expect(inputs[3]).toMatchObject({ cell: null, assumed: "a circular orbit" });
    expect(inputs[4]).toMatchObject({ cell: null, assumed: "90 deg, edge-on" });
    expect(unit).toBe("km/s");
    expect(result).toBe(call("REFLEX", 4.23, 1.1, "0.47 jupiterMass", null, undefined, headers, "km/s")[0]![0]);
  });

  test("one row of columns is told as that row alone", () => {
    const columns: Given[] = [column([4.23, 11]), column([1.1, 0.9]), column([0.47, 2]), undefined, undefined, headers];
    const story = told("REFLEX", columns, 1);
    expect(story.inputs[0]!.cell).toBe(11);
    expect(story.result).toBe(call("REFLEX", ...columns)[1]![0]);
  });

  test("a call without answer tells what was read nevertheless", () => {
    const { inputs, result, unit } = told("REFLEX", [4.23, "x", 0.47, 0.1, undefined, headers]);
    expect(result).toBeInstanceOf(CellError);
    expect((result as CellError).message).toContain('star mass is "x"');
    expect(unit).toBeUndefined();
    expect(inputs[0]!.reading?.value).toBe(4.23);
    expect(inputs[1]).toMatchObject({ cell: "x", reading: undefined, assumed: undefined, share: undefined });
  });

  test("too few headers: the cells are still shown", () => {
    const { inputs, result } = told("REFLEX", [4.23, 1.1, 0.47, undefined, undefined, headerRow("B$1", "d")]);
    expect(result).toBeInstanceOf(CellError);
    expect(inputs.map(({ cell }) => cell)).toEqual([4.23, 1.1, 0.47, null, null]);
  });

  test("words and lookups", () => {
    expect(told("AIR", ["500 nm"]).inputs[1]).toMatchObject({ cell: null, assumed: "Ciddor1996" });
    expect(told("AIR", ["500 nm", "Morton2000"]).inputs[1]).toMatchObject({ cell: "Morton2000", assumed: undefined });
    expect(told("CONSTANT", ["c", "km/s"])).toMatchObject({ result: 299792.458, unit: "km/s" });
    expect(told("TAG", ["4.2308(2) days"])).toMatchObject({ result: "4.2308 \u00b1 0.0002 d", unit: undefined });
  });
});

describe("shares of the uncertainty", () => {
  const shares = (name: string, given: readonly Given[]) => told(name, given).inputs.map(({ share }) => share);
  const sum = (parts: readonly (number | undefined)[]) => parts.reduce<number>((whole, part) => whole + (part ?? 0), 0);

  test("in a product of powers they follow the exponents", () => {
    // K goes as P^(-1/3) and, for a light planet, as m and M^(-2/3) (Lovis & Fischer 2010, eq. 14), so with relative
    // uncertainties of 3 %, 3 % and 1 % the parts are as 1, 4 and 1.
    const planetMass = "0.001 \u00b1 0.00001 earthMass";
    const given: Given[] = [[[100, 3]], [[1, 0.03]], planetMass, undefined, undefined, "d; solMass; earthMass"];
    const [period, star, planet] = shares("REFLEX", given);
    expect(period).toBeCloseTo(1 / 6, 5);
    expect(star).toBeCloseTo(4 / 6, 5);
    expect(planet).toBeCloseTo(1 / 6, 5);
  });

  test("they sum to 1, and the parts make up the whole uncertainty of the call", () => {
    const given: Given[] = [[[4.23, 0.01]], [[1.1, 0.1]], [[0.47, 0.02, 0.03]], [[0.1, 0.05]], [[80, 2]], headers];
    const story = told("REFLEX", given);
    expect(sum(story.inputs.map(({ share }) => share))).toBeCloseTo(1, 12);
    for (const { share } of story.inputs) expect(share).toBeGreaterThan(0);
    const variance = (cells: readonly unknown[]) => Number(cells[1]) ** 2 + Number(cells[2] ?? cells[1]) ** 2;
    const whole = variance(call("REFLEX", ...given)[0]!);
    // The call itself with the star's uncertainty alone.
    const star = variance(call("REFLEX", 4.23, [[1.1, 0.1]], 0.47, 0.1, 80, headers)[0]!);
    expect(story.inputs[1]!.share).toBeCloseTo(star / whole, 9);
  });

  test("one uncertainty alone is all of it; an exact input has no part", () => {
    expect(shares("REFLEX", [4.23, [[1.1, 0.1]], 0.47, undefined, undefined, headers])).toEqual([
      undefined,
      1,
      undefined,
      undefined,
      undefined,
    ]);
    expect(shares("REFLEX", [4.23, 1.1, 0.47, undefined, undefined, headers]).every((part) => part === undefined)).toBe(
      true,
    );
    expect(shares("INTO", ["4.23 \u00b1 0.01 d", undefined, "h"])).toEqual([1]);
  });

  test("an uncertainty in a unit of its own counts in that unit", () => {
    // 0.02 jupiterMass are 6.3565681318 earthMass (IAU 2015 B3).
    const units = headerRow("B$1", "P [d]", "M [solMass]", "sigma [solMass]", "m [jupiterMass]", "sigma [earthMass]");
    const own = told("REFLEX", [4.23, [[1.1, 0.1]], [[0.47, 6.3565681318]], undefined, undefined, units]);
    const same = told("REFLEX", [4.23, [[1.1, 0.1]], [[0.47, 0.02]], undefined, undefined, headers]);
    expect(own.inputs[2]!.reading!.upper).toBeCloseTo(0.02, 10);
    expect(own.inputs[2]!.share).toBeCloseTo(same.inputs[2]!.share!, 9);
  });
});
