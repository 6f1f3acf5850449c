import { readFileSync } from "node:fs";
import { afterAll, describe, expect, test } from "vitest";
import { barycell, type Ended, type Surroundings } from "./barycell.js";
import { expectGolden } from "./golden.js";
import { workFolder } from "./workFolder.js";

const folder = workFolder();
afterAll(() => folder.remove());
const survey = readFileSync(new URL("survey.csv", import.meta.url), "utf8");
folder.write("survey.csv", survey);

const usual = [
  ...["--hours", "30", "--from", "2027-02-01", "--to", "2027-05-31"],
  ...["--site", "-70.7345 deg, -29.2584 deg, 2400 m", "--value", "Priority"],
];
/** Progress that a slow machine shows is no part of what is told. */
async function quiet(words: readonly string[], surroundings: Surroundings): Promise<Ended> {
  const ended = await barycell(words, surroundings);
  return { ...ended, note: ended.note.replace(/^planning: .* steps\n/gm, "") };
}
const plan = (words: readonly string[] = []) =>
  quiet(["plan", "survey.csv", ...usual, ...words], { folder: folder.path });
/** The usual options, one of them with another value. */
const changed = (name: string, value: string) => {
  const words = usual.map((word, index) => (usual[index - 1] === name ? value : word));
  return quiet(["plan", "survey.csv", ...words], { folder: folder.path });
};

describe.concurrent("barycell plan", () => {
  test("writes the visits as a table, and tells what it did", async () => {
    const { code, out, note } = await plan();
    expect(code).toBe(0);
    const [header, ...rows] = out.trim().split("\n");
    expect(header).toBe(
      "Target,Night,Start,Exposure [s],Phase,Phase error,Airmass,Moon distance [deg],Barycentric correction [m/s]",
    );
    expect(rows).toHaveLength(52);
    expect(rows.every((row) => /^Lantern [13] [bc],2027-0[2-5]-\d\d,2027-0[2-6]-\d\dT\d\d:\d\d:00,/.test(row))).toBe(
      true,
    );
    expectGolden("planSummary", note.replace(/\d+\.\d+ h of darkness/, "... h of darkness"));
  });

  test("says the same twice, from standard input too", async () => {
    const first = await plan();
    expect(await plan()).toEqual(first);
    const piped = await barycell(["plan", "-", ...usual], { input: survey });
    expect(piped.out).toBe(first.out);
  });

  test("writes to files", async () => {
    const { code, out, note } = await plan(["--out", "visits.csv", "--summary", "summary.txt"]);
    expect({ code, out, note }).toEqual({ code: 0, out: "", note: "" });
    const whole = await plan();
    expect(folder.read("visits.csv")).toBe(whole.out);
    expect(folder.read("summary.txt")).toBe(whole.note);
  });

  test("as JSON", async () => {
    const { code, out } = await plan(["--json"]);
    expect(code).toBe(0);
    const found = JSON.parse(out);
    expect(found.chosen.map(({ name }: { name: string }) => name)).toEqual([
      "Lantern 1 b",
      "Lantern 1 c",
      "Lantern 3 b",
    ]);
    expect(found).toMatchObject({ budget: 30, value: 12, shortfalls: [], nights: 120 });
    expect(found.visits).toHaveLength(52);
    expect(found.leftOut).toHaveLength(2);
  });

  test("exits 1 where the wish cannot be granted, and says what to relax", async () => {
    const words = ["--must", "Lantern 4 b", "--must", "Lantern 3 b", "--must", "Lantern 1 b"];
    const found = await plan(words);
    expect(found).toEqual({
      code: 1,
      out: "",
      note: "barycell plan: the targets that have to be in need 31.5 h and the budget is 30 h; raise it to 31.5 h, or do without Lantern 4 b (17.5 h).\n",
    });
    const json = await plan([...words, "--json"]);
    expect(JSON.parse(json.out)).toEqual({ error: { message: found.note.slice(15, -1) } });
  });

  test("exits 1 with --strict where something is left out", async () => {
    expect((await plan(["--strict"])).code).toBe(1);
  });

  test("does not write over its input", async () => {
    const { code, note } = await plan(["--out", "survey.csv"]);
    expect(code).toBe(2);
    expect(note).toContain('--out "survey.csv" is the input itself; name another file, or add --force to replace it.');
    expect(folder.read("survey.csv")).toBe(survey);
  });
});

describe.concurrent("what cannot be understood", () => {
  const more = "barycell plan --help tells more.\n";
  test.each([
    ["--hours", "many", '--hours is "many"; it is a number of hours above 0, for example 120.'],
    ["--hours", "-5", '--hours is "-5"; it is a number of hours above 0, for example 120.'],
    ["--from", "1 Feb", '--from is "1 Feb"; it is a date from 1972-01-01 to 2035-12-30, for example 2027-02-01.'],
    ["--to", "2036-02-01", '--to is "2036-02-01"; it is a date from 1972-01-01 to 2035-12-30, for example 2027-02-01.'],
    ["--to", "2027-01-31", "--to lies before --from; give the first night first."],
    ["--value", "Prioritty", 'no column is headed "Prioritty"; did you mean "Priority"?'],
    [
      "--site",
      "La Silla",
      'the site is "La Silla"; longitude, latitude and height are needed, for example "-70.7345 deg, -29.2584 deg, 2400 m".',
    ],
  ])("%s %s", async (name, value, problem) => {
    expect(await changed(name, value)).toEqual({ code: 2, out: "", note: `barycell plan: ${problem}\n${more}` });
  });

  test.each([
    [
      ["--airmass", "0.5"],
      "--airmass is 0.5; it must be at least 1, because the zenith has the least air; for example 1.2.",
    ],
    [["--moon", "30"], '--moon is 30 with no unit; give its header (for example "--moon [deg]") or type "30 deg".'],
    [
      ["--sun", "18 deg"],
      "--sun is 18 deg; it must be at most 0, because with the Sun up there is no night; for example -18 deg.",
    ],
    [["--gap", "2 m"], '--gap is "2 m", a length; a duration is needed, for example 300 s.'],
    [
      ["--efficiency", "0"],
      "--efficiency is 0 or blank; it must be above 0, because without usable time there is no plan; for example 0.75.",
    ],
    [["--per-night", "0"], '--per-night is "0"; it is a number of visits, for example 1.'],
    [["--width", "0.7"], '--width is "0.7"; it is a part of the period above 0 and at most 0.5, for example 0.1.'],
    [
      ["--phases", "0.25;0.75"],
      '--phases is "0.25;0.75"; it is quadrature, any, or phases from 0 to 1 such as 0.25,0.75.',
    ],
    [["--column", "period"], '--column is "period"; it is a quantity and a header, for example "period=P orb [d]".'],
    [["--must", "Lantern 9 b"], '"Lantern 9 b" has to be in, but no target has that name; did you mean "Lantern 1 b"?'],
    [["--hours", "3"], "--hours was given 2 times; give it once."],
  ])("%j", async (words, problem) => {
    expect(await plan(words)).toEqual({ code: 2, out: "", note: `barycell plan: ${problem}\n${more}` });
  });

  test("options that are missing", async () => {
    expect(await barycell(["plan", "survey.csv"], { folder: folder.path })).toEqual({
      code: 2,
      out: "",
      note: `barycell plan: --from is missing; give it, for example --from 2027-02-01.\n${more}`,
    });
    expect((await barycell(["plan"])).note).toMatch(/^barycell plan: give one table, /);
    expect((await barycell(["plan", "nowhere.csv", ...usual], { folder: folder.path })).code).toBe(3);
  });
});
