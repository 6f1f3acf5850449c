import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { describeFunction } from "../../../src/catalog/describeFunction.js";
import { describeUnits } from "../../../src/catalog/describeUnits.js";
import { signature } from "../../../src/catalog/signature.js";
import { definitions } from "../../../src/functions/definitions.js";
import { barycell } from "./barycell.js";
import { expectGolden } from "./golden.js";

const commands = [
  "bench",
  "calc",
  "fill",
  "plan",
  "convert",
  "check",
  "recalc",
  "revise",
  "functions",
  "explain",
  "units",
  "demo",
];

describe.concurrent("--help", () => {
  test("of barycell and of every command is the golden text", async () => {
    const texts: string[] = [];
    for (const words of [["--help"], ...commands.map((name) => [name, "--help"])]) {
      const { code, out, note } = await barycell(words);
      expect({ words, code, note }).toEqual({ words, code: 0, note: "" });
      texts.push(`$ barycell ${words.join(" ")}\n${out}`);
    }
    for (const name of commands) expect(texts[0]).toContain(`  barycell ${name} `);
    expect(texts[0]).toMatch(/Exit codes: 0 .*; 1 .*; 2 .*;?\s.*3 /s);
    for (const line of texts.join("").split("\n")) expect(line.length, line).toBeLessThanOrEqual(120);
    expectGolden("help", texts.join("\n"));
  });

  test("is also what help COMMAND gives, and goes before all else on the line", async () => {
    const asked = await barycell(["calc", "--help"]);
    expect(await barycell(["help", "calc"])).toEqual(asked);
    expect(await barycell(["calc", "=1", "-h"])).toEqual(asked);
  });

  test("comes unasked, with exit code 2, where no command is given", async () => {
    expect(await barycell([])).toEqual({ ...(await barycell(["--help"])), code: 2 });
  });
});

test("--version is that of the package", async () => {
  const { version } = JSON.parse(readFileSync(new URL("../../../package.json", import.meta.url), "utf8"));
  expect(await barycell(["--version"])).toEqual({ code: 0, out: `${version}\n`, note: "" });
});

describe.concurrent("words that are not known", () => {
  test.each([
    [["fil"], "barycell: there is no command fil; did you mean fill?\n"],
    [["plot"], "barycell: there is no command plot; barycell --help lists them.\n"],
    [["help", "fil"], "barycell: there is no command fil; did you mean fill?\n"],
    [["explain", "reflx"], "barycell explain: there is no function reflx; did you mean REFLEX?\n"],
    [["explain", "zzzzzz"], "barycell explain: there is no function zzzzzz; barycell functions lists them.\n"],
    [["explain"], "barycell explain: give one function's name, for example REFLEX.\n"],
    [["explain", "AXIS", "SHIFT"], "barycell explain: give one function's name, for example REFLEX.\n"],
    [["units", "--all"], "barycell units: there is no option --all; it takes none.\n"],
    [
      ["functions", "AXIS"],
      "barycell functions: it takes no operands; barycell explain NAME tells about one function.\n",
    ],
  ])("%j", async (words, first) => {
    const { code, out, note } = await barycell(words);
    expect({ code, out }).toEqual({ code: 2, out: "" });
    const more = /^barycell (\w+):/.exec(first);
    expect(note).toBe(more ? `${first}barycell ${more[1]} --help tells more.\n` : first);
  });
});

describe.concurrent("functions, explain, units", () => {
  test("functions lists each with its question", async () => {
    const { code, out, note } = await barycell(["functions"]);
    expect({ code, note }).toEqual({ code: 0, note: "" });
    const lines = out.trimEnd().split("\n");
    expect(lines.filter((_, index) => index % 2 === 0)).toEqual(definitions.map(signature));
    expect(lines.filter((_, index) => index % 2 === 1)).toEqual(definitions.map(({ question }) => `    ${question}`));
  });

  test.each(["reflex", "BARY.CONSTANT", "bary.tag"])("explain %s tells all of it", async (asked) => {
    const name = asked.toUpperCase().replace("BARY.", "");
    const definition = definitions.find((candidate) => candidate.name === name)!;
    const out = `${describeFunction(definition).join("\n")}\n`;
    expect(await barycell(["explain", asked])).toEqual({ code: 0, out, note: "" });
  });

  test("explain REFLEX is the golden text", async () => {
    expectGolden("explainReflex", (await barycell(["explain", "REFLEX"])).out);
  });

  test("units lists them all", async () => {
    expect(await barycell(["units"])).toEqual({ code: 0, out: `${describeUnits().join("\n")}\n`, note: "" });
  });

  test("units TEXT tells what was read, quoted or not", async () => {
    const quoted = await barycell(["units", "km s-1"]);
    expect(quoted).toEqual(await barycell(["units", "km", "s-1"]));
    expect(quoted).toMatchObject({ code: 0, note: "" });
    expect(quoted.out).toContain("1000 m/s");
  });

  test("units TEXT that is not read exits 1", async () => {
    const out = '"Mjupp" is not a known unit; did you mean "Mjup" (jupiterMass)?\n';
    expect(await barycell(["units", "Mjupp"])).toEqual({ code: 1, out, note: "" });
  });
});

test("demo derives its columns and tells what needs attention", async () => {
  const { code, out, note } = await barycell(["demo"]);
  expect(code).toBe(0);
  expect(out).toMatch(/^barycell fill .*demo\.csv --show 20/);
  // One eccentricity of 1.08 and one star without mass are there on purpose.
  expect(note).toMatch(/^10 rows; 7 columns added .*; 13 cells need attention\.\n/);
  expect(note).toContain("eccentricity is 1.08");
  expect(note).toContain("star mass is blank");
});
