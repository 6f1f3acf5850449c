import { describe, expect, test } from "vitest";
import { CellError } from "../../src/call/cell.js";
import type { QuantityInput } from "../../src/functions/definition.js";
import { definitions } from "../../src/functions/definitions.js";
import { isPlainNumberKind } from "../../src/units/kind.js";
import { call, column, errorFrom, exampleOf, type Given, headerRow, numberFrom } from "./door.js";

/** The semi-amplitude of 1 jupiterMass around 1 solMass in a year of 365.25 d; computed: mpmath, 60 digits, from IAU 2015 B3. */
const amplitudeOfOne = 28.4324740778828;
/** K falls by (M + m)^(-2/3); the number above is for M + m = 1 solMass. */
const whole = (1 + 1 / 1047.56551466048) ** (-2 / 3);
const expected = amplitudeOfOne * whole;

describe("headers", () => {
  const reflex = (headers: Given, ...more: Given[]) => numberFrom("REFLEX", 365.25, 1, 1, ...more, headers);
  const bare = [undefined, undefined] as const;

  test.each<[string, Given]>([
    ["a range of header cells", headerRow("B$1", "Period [d]", "Star mass [solMass]", "Planet mass [jupiterMass]")],
    ["round brackets", headerRow("B$1", "P (d)", "M (Msun)", "m (Mjup)")],
    ["units alone, as in a units row", headerRow("B$2", "d", "solMass", "jupiterMass")],
    ["a column of header cells", column(["P [d]", "M [solMass]", "m [jupiterMass]"])],
    ["a text list", "d; solMass; jupiterMass"],
    ["a text list of headers", "P [d];M [solMass] ;m [Mjup]"],
  ])("%s", (_, headers) => {
    expect(Math.abs(reflex(headers, ...bare) / expected - 1)).toBeLessThan(1e-12);
  });

  test("cell i belongs to input i", () => {
    const months = reflex("365.25d; solMass; jupiterMass", ...bare);
    // P^(-1/3)
    expect(Math.abs(months / (expected * 365.25 ** (-1 / 3)) - 1)).toBeLessThan(1e-12);
    const kinds = errorFrom("REFLEX", 365.25, 1, 1, ...bare, "solMass; d; jupiterMass");
    expect(kinds.message).toContain("period is 365.25 solMass");
  });

  test("the header of an omitted input is ignored, whatever it says", () => {
    for (const ignored of ["e", "e [furlong]", "", "Notes", 3]) {
      const headers = headerRow("B$1", "P [d]", "M [solMass]", "m [jupiterMass]", ignored, "i [rad]");
      expect(numberFrom("REFLEX", 365.25, 1, 1, undefined, Math.PI / 6, headers)).toBeCloseTo(expected / 2, 10);
    }
  });

  test("headers of trailing omitted inputs may be there or not", () => {
    for (const more of ["", "; e", "; e; i [deg]"]) {
      expect(reflex(`d; solMass; jupiterMass${more}`, ...bare)).toBe(reflex("d; solMass; jupiterMass", ...bare));
    }
  });

  test("a word has none", () => {
    const linear = numberFrom("LINESHIFT", 500, 1, "linear", "nm; km/s");
    // 500 nm x (1 km/s / c), c of the SI
    expect(linear).toBeCloseTo((500 * 1000) / 299792458, 14);
    expect(errorFrom("LINESHIFT", 500, 1, "linear", "nm; km/s; model").message).toContain(
      "3 header cells were given for 2 inputs",
    );
  });

  test("any other count says both counts", () => {
    expect(errorFrom("REFLEX", 365.25, 1, 1, ...bare, "d; solMass").message).toContain(
      "2 header cells were given for 3 inputs",
    );
    expect(errorFrom("REFLEX", 1, 1, 1, 0, 1, "d; solMass; jupiterMass; e").message).toContain(
      "4 header cells were given for 5 inputs",
    );
    expect(errorFrom("REFLEX", 1, 1, 1, 0, 1, "d; solMass; jupiterMass; e; rad; m/s").message).toContain(
      "6 header cells were given for 5 inputs",
    );
    expect(call("REFLEX", [[1, 0.1]], 1, [[1, 0.1]], ...bare, "d; solMass")[0]![0]).toMatchObject({
      message: expect.stringContaining("2 header cells were given for 3 inputs in 5 columns") as string,
    });
  });

  describe("where inputs have uncertainties beside them", () => {
    const period: Given = [[365.25, 3.6525]];
    const sigmaOf = (headers: Given, ...more: Given[]) => {
      const [value, sigma] = call("REFLEX", period, 1, 1, ...more, headers)[0] as [number, number];
      return [value / expected, sigma / value];
    };

    test("one header for each input", () => {
      const [value, sigma] = sigmaOf("P [d]; M [solMass]; m [Mjup]", ...bare);
      expect(value).toBeCloseTo(1, 12);
      expect(sigma).toBeCloseTo(0.01 / 3, 9);
    });

    test("one header for each column", () => {
      const [value, sigma] = sigmaOf("P [d]; e_P; M [solMass]; m [Mjup]", ...bare);
      expect(value).toBeCloseTo(1, 12);
      expect(sigma).toBeCloseTo(0.01 / 3, 9);
    });

    test("the uncertainty's own header gives its unit", () => {
      const [, sigma] = sigmaOf("P [d]; e_P [h]; M [solMass]; m [Mjup]", ...bare);
      expect(sigma).toBeCloseTo(0.01 / 24 / 3, 9);
    });

    test("one header for each column, and those of omitted inputs", () => {
      const eccentricity: Given = [[0, 0]];
      const inclination: Given = [[Math.PI / 2, 0.1]];
      const cells = call("REFLEX", 365.25, 1, 1, undefined, inclination, "d; solMass; Mjup; i [rad]; e_i [deg]");
      expect(cells[0]![0]).toBeCloseTo(expected, 10);
      expect(call("REFLEX", 365.25, 1, 1, eccentricity, undefined, "d; solMass; Mjup; e; e_e")[0]![0]).toBeCloseTo(
        expected,
        10,
      );
    });

    test("a header of an omitted input is not taken for that of an uncertainty", () => {
      // Three headers, three columns: P, its uncertainty and M; the third header is that of the planet left out.
      const [value] = call("AXIS", [[365.25, 1]], 1, undefined, "P [d]; Star [solMass]; Planet [jupiterMass]")[0]!;
      // a = 0.999987409034049 AU; computed: mpmath, 60 digits, from IAU 2012 B2 and 2015 B3.
      expect(value).toBeCloseTo(0.999987409034049, 13);
    });
  });

  describe("the text's own unit", () => {
    test("wins over its header where the kinds agree", () => {
      const inYears = numberFrom("REFLEX", "1 yr", 1, 1, ...bare, "P [s]; solMass; jupiterMass");
      expect(inYears).toBeCloseTo(expected, 10);
      expect(numberFrom("REFLEX", "1 yr", 1, 1, ...bare, "P [nonsense]; solMass; jupiterMass")).toBeCloseTo(
        expected,
        10,
      );
    });

    test("is an error where they do not", () => {
      const { message } = errorFrom("REFLEX", "365.25 d", 1, 1, ...bare, "P [m]; solMass; jupiterMass");
      expect(message).toContain('"365.25 d", a duration, but its header "P [m]" says m, a length');
    });

    test("is taken from the header where the text has none", () => {
      expect(numberFrom("REFLEX", "365.25", 1, 1, ...bare, "d; solMass; jupiterMass")).toBeCloseTo(expected, 10);
      expect(numberFrom("INTO", "36 ", "min", "s")).toBe(2160);
    });
  });

  test("the result header asks for a unit, or is a unit", () => {
    for (const header of ["K [km/s]", "km/s", "Semi-amplitude (km s-1)", headerRow("G$1", "K [km/s]")]) {
      expect(numberFrom("REFLEX", 365.25, 1, 1, ...bare, "d; solMass; jupiterMass", header)).toBeCloseTo(
        expected / 1000,
        13,
      );
    }
    expect(numberFrom("INTO", "1 AU", undefined, "a [km]")).toBe(149597870.7); // IAU 2012 B2
  });

  test("a plain number's result header needs no unit, and may ask for one", () => {
    const z = 1 / 299792458; // SI
    expect(numberFrom("SHIFT", "1 m/s", "linear", undefined, "Shift")).toBeCloseTo(z, 20);
    expect(numberFrom("SHIFT", "1 m/s", "linear", undefined, "Shift [ppm]")).toBeCloseTo(z * 1e6, 14);
  });
});

describe("no silent default", () => {
  const dimensional = definitions.flatMap((definition) =>
    definition.form === "number"
      ? definition.inputs
          .filter((input): input is QuantityInput => input.takes === "quantity")
          .filter(({ quantity }) => !isPlainNumberKind(quantity.kind))
          .map((input) => ({ definition, name: definition.name, input: input.name }))
      : [],
  );

  test("most inputs have a dimension", () => expect(dimensional.length).toBeGreaterThan(30));

  test.each(dimensional)("$name: a bare $input is refused", ({ definition, name, input }) => {
    const values: Given[] = definition.inputs.map((one) =>
      one.takes === "quantity" && one.name === input ? one.quantity.example : exampleOf(one),
    );
    const error = errorFrom(name, ...values);
    expect(error.code).toBe("#VALUE!");
    expect(error.message).toContain(`${input} is `);
    expect(error.message).toContain("with no unit");
    // With headers that state no unit it is no better.
    const headers = definition.inputs.filter((one) => one.takes === "quantity").map((one) => `The ${one.name}`);
    const again = call(name, ...values, headerRow("B$1", ...headers))[0]![0];
    expect(again).toBeInstanceOf(CellError);
    expect((again as CellError).message).toContain("with no unit");
  });

  test("nor for any quantity", () => {
    expect(errorFrom("INTO", 1, undefined, "km").message).toContain("value is 1 with no unit");
    expect(errorFrom("TAG", 1).message).toContain("value is 1 with no unit");
  });
});
