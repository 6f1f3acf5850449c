import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { CellError } from "../../../src/call/cell.js";
import { type Block, blockOf, cellAt, columnOf } from "../../../src/call/column.js";
import { takesHeaders } from "../../../src/functions/argumentNames.js";
import { definitions } from "../../../src/functions/definitions.js";
import { launchChromium } from "../../browser/launchChromium.js";
import { type Served, serveFiles } from "../../browser/serveFiles.js";
import { argumentOf, functionNamed, type Given, headerRow } from "../../call/door.js";
import { messageCalls } from "../../call/messageCalls.js";
import { barycell } from "../cli/barycell.js";
import { addinFolderFiles } from "./addinFolder.js";
import { callRuntime, codeNumbers, openRuntimePage, type RuntimeAnswer } from "./runtimePage.js";
import { expectedAnswer, plainAnswer, runtimeCall } from "./runtimeValues.js";

const files = addinFolderFiles();
let browser: Browser;
let served: Served;
let page: Page;
const mistakes: Error[] = [];

beforeAll(async () => {
  [browser, served] = await Promise.all([launchChromium(), serveFiles(files)]);
  page = await openRuntimePage(browser, served.base, files.get("pane.html")!.toString());
  page.on("pageerror", (error) => mistakes.push(error));
});
afterAll(async () => {
  await browser?.close();
  await served?.close();
});

type Call = readonly [string, ...Given[]];

function library(name: string, given: readonly Given[]): Block {
  return functionNamed(name).once(given.map(argumentOf));
}

async function answers(calls: readonly Call[]): Promise<RuntimeAnswer[]> {
  return (
    await callRuntime(
      page,
      calls.map(([name, ...given]) => runtimeCall(name, given)),
    )
  ).map(plainAnswer);
}

/** Whatever the runtime sends back is what the library gives, to the last bit. */
async function expectAsLibrary(calls: readonly Call[]): Promise<RuntimeAnswer[]> {
  const found = await answers(calls);
  expect(found).toEqual(calls.map(([name, ...given]) => expectedAnswer(library(name, given))));
  return found;
}

const heads = headerRow("B$1", "Period [d]", "Star mass [solMass]", "Planet mass [jupiterMass]");
const below = (values: readonly number[]) => values.map((value) => [value]);

describe("the built functions in the host's runtime", () => {
  test("answer every function's examples", async () => {
    const calls = definitions.flatMap((definition) =>
      definition.examples.map(({ cells, result }): Call => {
        const places = definition.inputs.length + (takesHeaders(definition) ? 1 : 0);
        const given: Given[] = cells.map((text) => (Number.isFinite(Number(text)) ? Number(text) : text));
        while (result !== undefined && given.length < places) given.push(undefined);
        return [definition.name, ...given, result];
      }),
    );
    const found = await expectAsLibrary(calls);
    expect(found.filter((answer) => !("value" in answer))).toEqual([]);
    // IAU 2012 Resolution B2: the astronomical unit is 149597870.7 km.
    expect(await answers([["INTO", "1 AU", undefined, "km"]])).toEqual([{ value: [[149597870.7]] }]);
  });

  test("say every sentence", async () => {
    // A host hands over an empty text for a blank cell, which the other hosts tell apart.
    const calls = messageCalls
      .filter(({ filledDown, given }) => filledDown === undefined && !given.includes(""))
      .map(({ function: name, given }): Call => [name, ...given]);
    expect(calls.length).toBeGreaterThan(100);
    const found = await expectAsLibrary(calls);
    const codes = new Set(found.map((answer) => ("code" in answer ? answer.code : undefined)));
    expect(codes).toContain(codeNumbers["#VALUE!"]);
    expect(codes).toContain(codeNumbers["#N/A"]);
  });

  test("spill columns, with uncertainties, and let one bad row spoil itself alone", async () => {
    const [spill] = await expectAsLibrary([
      [
        "REFLEX",
        below([4.23, 0, 11.9]),
        1.1,
        [
          [0.47, 0.02, 0.01],
          [1, 0.1, 0.1],
          [2, 0, 0],
        ],
        undefined,
        undefined,
        heads,
      ],
    ]);
    const rows = (spill as { value: unknown[][] }).value;
    expect(rows.map((row) => row.map((cell) => typeof cell))).toEqual([
      ["number", "number", "number"],
      ["object", "object", "object"],
      ["number", "number", "number"],
    ]);
    expect(rows[1]![0]).toMatchObject({ code: "#VALUE!", message: expect.stringContaining("period is 0 or blank") });
    expect(rows[2]!.slice(1)).toEqual([0, 0]);
  });

  test("take 0 for a blank cell of a range, and say so where it would give a plausible answer", async () => {
    const [mass, omitted, circular] = await answers([
      ["REFLEX", 4.23, 1.1, 0, undefined, undefined, heads],
      ["REFLEX", 4.23, 1.1, undefined, undefined, undefined, heads],
      ["REFLEX", 4.23, 1.1, 0.47, 0, undefined, { ...heads, cells: [[...heads.cells[0]!, "e"]] }],
    ]);
    expect(mass).toMatchObject({ message: expect.stringContaining("planet mass is 0 or blank"), code: 7 });
    expect(omitted).toMatchObject({ message: expect.stringContaining("planet mass is missing"), code: 1 });
    expect(circular).toEqual(expectedAnswer(library("REFLEX", [4.23, 1.1, 0.47, undefined, undefined, heads])));
  });

  test("pass on the error of an input cell", async () => {
    const codes = ["#VALUE!", "#N/A", "#DIV/0!", "#NUM!", "#NULL!", "#REF!", "#NAME?"] as const;
    const calls = codes.map(
      (code): Call => ["REFLEX", new CellError(code, "t", "said there"), 1.1, 0.47, undefined, undefined, heads],
    );
    const found = await expectAsLibrary(calls);
    expect(found.slice(0, 5)).toEqual(
      codes
        .slice(0, 5)
        .map((code) => ({ code: codeNumbers[code], message: codes.indexOf(code) < 2 ? "said there" : "" })),
    );
    expect(found.slice(5)).toMatchObject([{ value: [[{ code: "#REF!" }]] }, { value: [[{ code: "#NAME?" }]] }]);
  });

  test("refuse a whole column of the worksheet", async () => {
    const whole = await page.evaluate(async () => {
      const column = new Array(1_048_576).fill([0]);
      const world = globalThis as unknown as { callAll(calls: unknown): Promise<unknown[]> };
      return (await world.callAll([["AXIS", [column, [["1 solMass"]]], null]]))[0];
    });
    expect(whole).toMatchObject({ message: expect.stringContaining("a whole column of the worksheet"), code: 7 });
  });

  const many = 100_000;
  const periods = Array.from({ length: many }, (_, row) => 0.5 + row * 0.03125);
  const masses = Array.from({ length: many }, (_, row) => 0.003 + (row % 4096) / 512);

  test("compute a column of 100,000 rows", async () => {
    const found = await answers([
      ["REFLEX", below(periods), "1.1 solMass", below(masses), undefined, undefined, heads],
    ]);
    const numbers = (found[0] as { value: number[][] }).value.map(([number]) => number!);
    const wanted = library("REFLEX", [below(periods), "1.1 solMass", below(masses), undefined, undefined, heads]);
    expect(numbers.length).toBe(many);
    expect(numbers.findIndex((number, row) => !Object.is(number, wanted.columns[0]!.numbers[row]))).toBe(-1);
  });

  test("compute 20,000 single calls", async () => {
    const rows = 20_000;
    const calls = periods
      .slice(0, rows)
      .map((period, row): Call => ["REFLEX", period, 1.1, masses[row]!, undefined, undefined, heads]);
    const found = await answers(calls);
    const wanted = functionNamed("REFLEX").eachRow(rows, [
      { perRow: [columnOf(periods.slice(0, rows))] },
      { fixed: { block: blockOf([[1.1]]) } },
      { perRow: [columnOf(masses.slice(0, rows))] },
      { fixed: undefined },
      { fixed: undefined },
      { fixed: argumentOf(heads) },
    ]);
    const wrong = found.findIndex((answer, row) => {
      const number = "value" in answer ? (answer.value as number[][])[0]![0] : Number.NaN;
      return !Object.is(number, cellAt(wanted.columns[0]!, row));
    });
    expect(wrong).toBe(-1);
  });

  test("give the numbers of the command line", async () => {
    const rows = 500;
    const lines = periods.slice(0, rows).map((period, row) => `${period},${masses[row]! + 0.1},${0.01 * (row % 7)}`);
    const table = `Period [d],Planet mass [jupiterMass],s\n${lines.join("\n")}\n`;
    const formula = '=BARY.REFLEX(A2,"0.9 solMass",B2:C2,,,"d;solMass;jupiterMass",D$1)';
    const { code, out } = await barycell(["fill", "-", "--set", "K [km/s]", formula], { input: table });
    expect(code).toBe(0);
    const filled = out
      .trim()
      .split("\n")
      .slice(1)
      .map((line) => line.split(",").slice(3).map(Number));
    const mass = masses.slice(0, rows).map((value, row) => [value + 0.1, 0.01 * (row % 7)]);
    const [found] = await answers([
      [
        "REFLEX",
        below(periods.slice(0, rows)),
        "0.9 solMass",
        mass,
        undefined,
        undefined,
        "d;solMass;jupiterMass",
        "K [km/s]",
      ],
    ]);
    expect(filled).toHaveLength(rows);
    expect(found).toEqual({ value: filled });
  });

  test("stop nowhere on the way", () => {
    expect(mistakes).toEqual([]);
  });
});
