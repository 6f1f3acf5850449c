import { describe, expect, test } from "vitest";
import { type Cell, CellError, type ErrorCode } from "../../src/call/cell.js";
import { definitions } from "../../src/functions/definitions.js";
import { call, errorFrom, exampleText, type Given, numberFrom } from "./door.js";

/** A call whose inputs are all good, as quantity texts. */
function goodCall(name: string): { readonly values: Cell[]; readonly definition: (typeof definitions)[number] } {
  const definition = definitions.find((one) => one.name === name)!;
  const values = definition.inputs.map((input): Cell => {
    if (input.takes === "word") return input.words[0]!.word;
    if (input.takes === "quantity") return exampleText(input.quantity);
    if (input.takes === "count") return 1;
    return definition.examples[0].cells[0]!;
  });
  return { values, definition };
}

const numeric = definitions.filter(({ form }) => form === "number");
const inputsOf = numeric.flatMap(({ name, inputs }) =>
  inputs.map((input, index) => ({
    name,
    index,
    input: input.name,
    takes: input.takes,
    required: input.takes === "quantity" && input.fallback === undefined,
  })),
);

describe("states of the inputs", () => {
  test.each(inputsOf.filter(({ required }) => required))("$name: blank $input gives #N/A", ({ name, index, input }) => {
    const { values } = goodCall(name);
    const error = errorFrom(name, ...values.with(index, null));
    expect(error.code).toBe("#N/A");
    expect(error.message.startsWith(`${name}: ${input} is blank; `)).toBe(true);
  });

  test.each(inputsOf)("$name: an error in $input is passed on unchanged", ({ name, index }) => {
    const { values } = goodCall(name);
    for (const code of ["#REF!", "#DIV/0!", "#NAME?", "#NUM!", "#NULL!", "#N/A", "#VALUE!"] as ErrorCode[]) {
      const error = new CellError(code, "elsewhere", "of another cell");
      expect(errorFrom(name, ...values.with(index, error))).toBe(error);
    }
  });

  test("the four functions of units pass errors and blanks on, too", () => {
    const error = new CellError("#REF!", "elsewhere", "gone");
    for (const name of ["INTO", "TAG", "UNITOF", "CONSTANT"]) {
      const rest: Given[] = name === "INTO" ? [undefined, "km"] : [];
      expect(errorFrom(name, error, ...rest)).toBe(error);
      expect(errorFrom(name, null, ...rest).code).toBe("#N/A");
    }
  });

  test.each(inputsOf.filter(({ takes }) => takes === "quantity"))("$name: text in $input is refused", (one) => {
    const { values } = goodCall(one.name);
    for (const text of ["n/a", "", "about 3", "TRUE", "1/3", "\u2014"]) {
      const error = errorFrom(one.name, ...values.with(one.index, text));
      expect(error.code).toBe("#VALUE!");
      expect(error.message).toContain(`${one.input} is `);
    }
    expect(errorFrom(one.name, ...values.with(one.index, true)).message).toContain("TRUE, a logical value");
  });
});

describe("zero, which a blank cell may be handed over as", () => {
  const cases: readonly [string, string][] = [
    ["AXIS", "period"],
    ["AXIS", "star mass"],
    ["PERIOD", "axis"],
    ["PERIOD", "star mass"],
    ["TOTALMASS", "axis"],
    ["TOTALMASS", "period"],
    ["STARAXIS", "planet mass"],
    ["PLANETSPEED", "star mass"],
    ["STARSPEED", "planet mass"],
    ["REFLEX", "period"],
    ["REFLEX", "star mass"],
    ["REFLEX", "planet mass"],
    ["REFLEX", "inclination"],
    ["MINMASS", "K"],
    ["MINMASS", "period"],
    ["MINMASS", "star mass"],
    ["PLANETMASS", "K"],
    ["PLANETMASS", "inclination"],
    ["MASSFUNCTION", "K"],
    ["PLANETSHIFT", "planet mass"],
    ["SHIFTMASS", "shift"],
    ["SHIFTMASS", "inclination"],
    ["PIXELSHIFT", "resolving power"],
    ["PIXELSPEED", "pixels per resolution element"],
  ];
  test.each(cases)("%s refuses 0 for %s", (name, input) => {
    const { values, definition } = goodCall(name);
    const index = definition.inputs.findIndex((one) => one.name === input);
    expect(index).toBeGreaterThanOrEqual(0);
    const unit = String(values[index]).split(" ").slice(1).join(" ");
    for (const zero of ["0", "-0", "0.0e5"]) {
      const error = errorFrom(name, ...values.with(index, `${zero} ${unit}`));
      expect(error.code).toBe("#VALUE!");
      expect(error.message.startsWith(`${name}: ${input} is 0 or blank; it must be above 0, because `)).toBe(true);
    }
  });

  test("an eccentricity of 0, blank or left out is a circle", () => {
    const circle = numberFrom("REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass");
    for (const eccentricity of [0, null, undefined, "0", "0 %"]) {
      expect(numberFrom("REFLEX", "4.23 d", "1.1 solMass", "0.47 jupiterMass", eccentricity)).toBe(circle);
    }
  });

  test("a speed or a pixel shift of 0 is an answer", () => {
    expect(numberFrom("SHIFT", "0 m/s")).toBe(0);
    expect(numberFrom("SHIFTSPEED", 0)).toBe(0);
    expect(numberFrom("PIXELSHIFT", "0 m/s", 115000, 3.2)).toBe(0);
    expect(numberFrom("PIXELSPEED", 0, 115000, 3.2)).toBe(0);
  });

  test("a planet of mass 0 is one whose mass is neglected, where that is asked for", () => {
    const neglected = numberFrom("AXIS", "4.23 d", "1.1 solMass");
    expect(numberFrom("AXIS", "4.23 d", "1.1 solMass", "0 jupiterMass")).toBe(neglected);
    expect(numberFrom("AXIS", "4.23 d", "1.1 solMass", null)).toBe(neglected);
  });
});

describe("numbers outside the physics", () => {
  const reflex = (e: Given, i?: Given) => ["4.23 d", "1.1 solMass", "0.47 jupiterMass", e, i] as const;
  test.each<[string, readonly Given[], RegExp]>([
    ["REFLEX", reflex(1), /eccentricity is 1; it must be below 1, because only bound orbits repeat/],
    ["REFLEX", reflex(1.2), /eccentricity is 1.2; it must be below 1/],
    ["REFLEX", reflex("100 %"), /eccentricity is 100 %; it must be below 1/],
    ["REFLEX", reflex(-1e-9), /eccentricity is -1e-9; it must be at least 0/],
    ["REFLEX", reflex(0, "180 deg"), /inclination is 180 deg; it must be below 180 deg/],
    ["REFLEX", reflex(0, "-1 deg"), /inclination is -1 deg; it must be above 0/],
    ["REFLEX", reflex(0, "200 deg"), /inclination is 200 deg; it must be below 180 deg/],
    ["REFLEX", ["-4.23 d", "1 solMass", "1 jupiterMass"], /period is -4.23 d; it must be above 0/],
    ["REFLEX", ["4.23 d", "-1 solMass", "1 jupiterMass"], /star mass is -1 solMass; it must be above 0/],
    ["AXIS", ["4.23 d", "1 solMass", "-1 earthMass"], /planet mass is -1 earthMass; it must be at least 0/],
    ["SHIFT", ["299792458 m/s"], /speed is 299792458 m\/s; it must be below the speed of light/],
    ["SHIFT", ["-299792.458 km/s"], /it must be above minus the speed of light/],
    ["MINMASS", ["1e9 m/s", "1 d", "1 solMass"], /K is 1000000000 m\/s; it must be below the speed of light/],
    ["SHIFTSPEED", [-1], /shift is -1; it must be above -1/],
    ["SHIFTSPEED", [-2], /shift is -2; it must be above -1/],
    ["AIR", ["199.9 nm"], /it must be at least 200 nm/],
    ["VACUUM", ["2501 nm"], /it must be at most 2500 nm/],
    ["LINESHIFT", ["-500 nm", "1 m/s"], /rest wavelength is -500 nm; it must be above 0/],
    ["PIXELSHIFT", ["1 m/s", -1, 3], /resolving power is -1; it must be above 0/],
    ["SHIFT", ["40000 km/s", "linear"], /the linear model is refused above a tenth of the speed of light/],
    ["SHIFT", ["-40000 km/s", "linear"], /the linear model is refused/],
    ["SHIFTSPEED", [0.11, "linear"], /the linear model is refused/],
    ["LINESHIFT", ["500 nm", "0.2e9 m/s", "linear"], /the linear model is refused/],
  ])("%s %j", (name, given, message) => {
    const error = errorFrom(name, ...given);
    expect(error.code).toBe("#VALUE!");
    expect(error.message).toMatch(message);
  });

  test.each<[string, readonly Given[]]>([
    ["REFLEX", reflex(0.9999999)],
    ["REFLEX", reflex(0, "179.999 deg")],
    ["SHIFT", ["299792457.9 m/s"]],
    ["SHIFT", ["0.0999 km/s", "linear"]],
    ["SHIFT", ["29979245 m/s", "linear"]],
    ["SHIFTSPEED", [-0.999999]],
    ["AIR", ["200 nm"]],
    ["AIR", ["2500 nm"]],
    ["VACUUM", ["0.2 um"]],
    ["VACUUM", ["25000 Angstrom"]],
  ])("just inside, %s %j has an answer", (name, given) => {
    expect(Number.isFinite(numberFrom(name, ...given))).toBe(true);
  });
});

describe("kinds, not only dimensions", () => {
  test.each<[string, readonly Given[], string]>([
    ["REFLEX", ["4.23 d", "1 solMass", "1 jupiterMass", "5 deg"], "an angle"],
    ["REFLEX", ["4.23 d", "1 solMass", "1 jupiterMass", 0, "1.5"], "no unit"],
    ["AXIS", ["2455000 JD_UTC", "1 solMass"], "an instant"],
    ["AXIS", ["2455000.5 BJD_TDB-2450000", "1 solMass"], "an instant"],
    ["AXIS", ["2010-03-05", "1 solMass"], "an instant"],
    ["SHIFTSPEED", ["0.1 mag"], "a magnitude"],
    ["SHIFTSPEED", ["1 pixel"], "detector pixels"],
    ["PIXELSPEED", ["1 count", 115000, 3.2], "a count"],
    ["PIXELSPEED", ["1 AU", 115000, 3.2], "a length"],
    ["SHIFT", ["1 Hz"], "a frequency"],
    ["SHIFT", ["1 deg/s"], "an angular speed"],
    ["AIR", ["20000 m**-1"], "a wavenumber"],
    ["MASSFUNCTION", ["1 m/s**2", "1 d"], "an acceleration"],
    ["REFLEX", ["4.23 d", "1 J", "1 jupiterMass"], "an energy"],
  ])("%s %j", (name, given, kind) => {
    const error = errorFrom(name, ...given);
    expect(error.code).toBe("#VALUE!");
    expect(error.message).toContain(kind);
  });

  test("a plain number may stand for pixels, but not pixels for a plain number", () => {
    expect(numberFrom("PIXELSPEED", 1, 115000, 3.2)).toBe(numberFrom("PIXELSPEED", "1 pix", 115000, "3.2 pixel"));
    expect(errorFrom("PIXELSPEED", 1, "115000 pixel", 3.2).message).toContain("resolving power");
  });

  test("words are found whatever their capitals, and refused otherwise", () => {
    expect(numberFrom("SHIFT", "1 m/s", "LINEAR")).toBe(numberFrom("SHIFT", "1 m/s", " linear "));
    expect(numberFrom("SHIFT", "1 m/s", null)).toBe(numberFrom("SHIFT", "1 m/s", "relativistic"));
    for (const word of ["newton", 1, true]) expect(errorFrom("SHIFT", "1 m/s", word).code).toBe("#VALUE!");
  });
});

test("a call without arguments has one answer, which says what is missing", () => {
  for (const { name } of definitions) {
    const cells = call(name);
    expect(cells).toHaveLength(1);
    expect(cells[0]![0]).toMatchObject({ code: "#N/A", message: expect.stringContaining("is missing") as string });
  }
});
