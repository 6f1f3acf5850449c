import { describe, expect, test } from "vitest";
import { barycell } from "./barycell.js";

const calc = (...words: string[]) => barycell(["calc", ...words]);

async function json(formula: string) {
  const { code, out, note } = await calc(formula, "--json");
  expect(note).toBe("");
  expect(out.endsWith("}\n")).toBe(true);
  return { code, answer: JSON.parse(out) };
}

describe.concurrent("an answer as text", () => {
  test.each([
    // SI (2019): c is exact.
    ['=BARY.CONSTANT("c")', "299792458 m/s\n"],
    ['BARY.CONSTANT("c", "km/s")', "299792.458 km/s\n"],
    // A day has 24 hours; uncertainties scale as values do.
    ['=BARY.INTO("2 d",, "h")', "48 h\n"],
    ['=BARY.INTO("2.0 \u00b1 0.5 d",, "h")', "48 \u00b1 12 h\n"],
    ['=BARY.INTO("2 +0.5 -0.25 d",, "h")', "48 +12 -6 h\n"],
    ['=BARY.INTO({1;2}, "d", "h")', "24 h\n48 h\n"],
    ['=BARY.INTO({1,0.5;2,0.25}, "d", "h")', "24 \u00b1 12 h\n48 \u00b1 6 h\n"],
    // A plain number states no unit: v/c for v = c/16, a power of two.
    ['=BARY.SHIFT("18737.028625 km/s", "linear")', "0.0625\n"],
    ['=BARY.UNITOF("Mass [Mjup]")', "jupiterMass\n"],
    // ISO/IEC 26300-3: operators and functions of every worksheet.
    ["=1+2*3", "7\n"],
    ["={1,2;3,4}", "1\t2\n3\t4\n"],
    ['="a"&"b"', "ab\n"],
    ["=1>2", "FALSE\n"],
    ["=SUM(1,2,3)/MAX(2,4)", "1.5\n"],
    ["-1", "-1\n"],
  ])("%s", async (formula, out) => {
    expect(await calc(formula)).toEqual({ code: 0, out, note: "" });
  });
});

describe.concurrent("an answer as JSON", () => {
  test.each<[string, object]>([
    ['=BARY.INTO("2 d",, "h")', { value: 48, unit: "h" }],
    ['=BARY.INTO("2.0 \u00b1 0.5 d",, "h")', { value: 48, unit: "h", sigma: 12 }],
    ['=BARY.INTO("2 +0.5 -0.25 d",, "h")', { value: 48, unit: "h", sigma: [12, 6] }],
    ['=BARY.INTO({1;2}, "d", "h")', { value: [[24], [48]], unit: "h" }],
    ['=BARY.INTO({1,0.5;2,0.25}, "d", "h")', { value: [[24, 12], [48, 6]], unit: "h" }], // biome-ignore format: a row a line
    ["={1,2;3,4}", { value: [[1, 2], [3, 4]], unit: null }], // biome-ignore format: a row a line
    ['=BARY.UNITOF("Mass [Mjup]")', { value: "jupiterMass", unit: null }],
    ["=1>2", { value: false, unit: null }],
    ["=0.1+0.2", { value: 0.30000000000000004, unit: null }],
  ])("%s", async (formula, answer) => {
    expect(await json(formula)).toEqual({ code: 0, answer: { formula, ...answer } });
  });

  test("K of Jupiter's mass at one year is 28.4329 m/s, the total mass aside", async () => {
    // Lovis & Fischer 2010, in Exoplanets (ed. Seager), eq. 14; the coefficient from memory. 1047.57: GM_sun/GM_jupiter,
    // 1.3271244e20 / 1.2668653e17 (IAU 2015 Resolution B3).
    const { answer } = await json('=BARY.REFLEX("1 yr", "1 solMass", "1 jupiterMass", 0.6)');
    const expected = 28.4329 / Math.sqrt(1 - 0.6 ** 2) / (1 + 1.2668653e17 / 1.3271244e20) ** (2 / 3);
    expect(Math.abs(answer.value / expected - 1)).toBeLessThan(5e-5);
    expect(answer.unit).toBe("m/s");
  });
});

describe.concurrent("no answer", () => {
  test.each([
    ['=BARY.INTO("2 d",, "kg")', "#VALUE!", /^INTO: .*a duration.*a mass/],
    ['=BARY.REFLEX("4.23 d", "1.1 solMass", 0.47)', "#VALUE!", /planet mass is 0\.47 with no unit.*0\.47 jupiterMass/],
    ['=BARY.AXIS("", "1.1 solMass")', "#VALUE!", /^AXIS: period is an empty text.*4\.23 d/],
    ['=BARY.AXIS(, "1.1 solMass")', "#N/A", /^AXIS: period is missing/],
    ["=1/0", "#DIV/0!", /1 \/ 0/],
    ["=A1+1", "#REF!", /^A1: calc has no table.*barycell fill/],
  ])("%s", async (formula, code, message) => {
    const { code: exit, answer } = await json(formula);
    expect(exit).toBe(1);
    expect(Object.keys(answer)).toEqual(["formula", "error"]);
    expect(answer.formula).toBe(formula);
    expect(answer.error).toEqual({ code, message: expect.stringMatching(message) });
    expect(await calc(formula)).toEqual({ code: 1, out: "", note: `${code} ${answer.error.message}\n` });
  });

  test.each([
    // Where the mark stands, counted in the formula by hand.
    ['=BARY.AXIS("4.23 d"', 10, /^#NAME\?/, /character 11: .*never closed; add "\)"/],
    ["=1 2", 3, /^#NAME\?/, /character 4: "2" does not belong here/],
    ['=BARY.AXIS("4.23 d"; "1 solMass")', 19, /^#NAME\?/, /separated by ","/],
    ['=1+BARY.REFLX("4.23 d")', 3, /^#NAME\?/, /did you mean BARY\.REFLEX\?/],
    ["=SUMM(1, 2)", 1, /^#NAME\?/, /did you mean SUM\?/],
    ['=BARY.REFLEX("4.23 d")', 1, /^#VALUE!/, /1 argument.*3 to 7/],
    ["=", 1, /^#NAME\?/, /nothing follows/],
  ])("a mark under the place: %s", async (formula, place, code, message) => {
    const { code: exit, out, note } = await calc(formula);
    const [first, shown, mark, ...rest] = note.split("\n");
    expect({ exit, out, shown }).toEqual({ exit: 1, out: "", shown: `  ${formula}` });
    expect(first).toMatch(code);
    expect(mark).toBe(`  ${" ".repeat(place)}^`);
    expect(rest.join("\n")).toMatch(message);
  });

  test("a formula that cannot be read is JSON too", async () => {
    const formula = '=BARY.AXIS("4.23 d"';
    const { code, answer } = await json(formula);
    expect({ code, answer }).toEqual({
      code: 1,
      answer: { formula, error: { code: "#NAME?", message: expect.stringContaining('add ")"') } },
    });
  });

  test("one bad row spoils its own row", async () => {
    const formula = '=BARY.INTO({1;2;3}/{1;0;1}, "d", "h")';
    const { code, out, note } = await calc(formula);
    expect({ code, out }).toEqual({ code: 1, out: "24 h\n#DIV/0!\n72 h\n" });
    expect(note).toMatch(/^#DIV\/0! .*2 \/ 0.*\n$/);
    const { answer } = await json(formula);
    expect(answer.value).toEqual([[24], [{ error: { code: "#DIV/0!", message: note.slice(8, -1) } }], [72]]);
  });

  test("an uncertainty that cannot be read leaves the value", async () => {
    const formula = '=BARY.INTO({2,"x"}, "d", "h")';
    const { code, out, note } = await calc(formula);
    expect({ code, out }).toEqual({ code: 1, out: "48 \u00b1 #VALUE! h\n" });
    expect(note).toMatch(/uncertainty of value is "x", not a number/);
    const { answer } = await json(formula);
    expect(answer).toMatchObject({ value: 48, unit: "h", sigma: { error: { code: "#VALUE!" } } });
  });
});

describe.concurrent("standard input and the command line", () => {
  test("a dash reads the formula, with line breaks", async () => {
    const { code, out } = await barycell(["calc", "-"], { input: '=BARY.INTO("2 d",,\n  "h")\n' });
    expect({ code, out }).toEqual({ code: 0, out: "48 h\n" });
  });

  test("an empty standard input is a formula that lacks everything", async () => {
    const { code, note } = await barycell(["calc", "-"]);
    expect(code).toBe(1);
    expect(note).toContain("nothing follows");
  });

  test.each([
    [[], "give one formula, in quotes."],
    [["=1", "=2"], "give one formula, in quotes."],
    [["=1", "--jsn"], "there is no option --jsn; did you mean --json?"],
    [["=1", "--json=yes"], "--json takes no value, 1 given."],
  ])("%j", async (words, message) => {
    const note = `barycell calc: ${message}\nbarycell calc --help tells more.\n`;
    expect(await calc(...words)).toEqual({ code: 2, out: "", note });
  });
});

describe.concurrent("one of our functions without its namespace", () => {
  test.each(["REFLEX", "INTO", "Period"])("=%s(...) is named in full", async (name) => {
    const { code, note } = await calc(`=${name}("1 AU")`);
    expect(code).toBe(1);
    expect(note).toContain(`no function has this name; did you mean BARY.${name.toUpperCase()}?`);
  });
});
