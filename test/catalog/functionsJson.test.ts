import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { type FunctionsJson, functionsJson, type HostFunction } from "../../src/catalog/functionsJson.js";
import { definitions } from "../../src/functions/definitions.js";
import { isProblem } from "../../src/units/problem.js";
import { readUnit } from "../../src/units/readUnit.js";
import { functionsJsonProblems } from "./functionsJsonProblems.js";
import { brokenPromises, callLines } from "./promisedFunctions.js";
import { schemaProblems } from "./schemaProblems.js";

const json = functionsJson("https://localhost:3443/help.html");
const promised = readFileSync(new URL("functions.golden.txt", import.meta.url), "utf8")
  .trim()
  .split("\n");

function withFirst(change: Partial<HostFunction>): FunctionsJson {
  return { ...json, functions: [{ ...json.functions[0]!, ...change }, ...json.functions.slice(1)] };
}

describe("functions.json", () => {
  test("keeps every name and the order of every function's arguments", () => {
    expect(brokenPromises(promised, callLines(json))).toEqual([]);
  });

  test("has every definition, once", () => {
    expect(json.functions.map(({ id }) => id)).toEqual(definitions.map(({ name }) => name));
  });

  test("keeps the rules of the host", () => {
    expect(functionsJsonProblems(json)).toEqual([]);
  });

  test("fits the schema of the host, item by item", () => {
    for (const { options, ...item } of json.functions) {
      // The schema keeps the options flat on the function, and names this one in the singular.
      expect(options).toEqual({ requiresParameterAddresses: true });
      expect(schemaProblems("extensionFunction", { ...item, requiresParameterAddress: true })).toEqual([]);
      for (const parameter of item.parameters) {
        expect(schemaProblems("extensionFunctionParameter", parameter)).toEqual([]);
      }
    }
    for (const choices of json.enums) expect(schemaProblems("enum", choices)).toEqual([]);
    expect(json.enums.length).toBeLessThanOrEqual(256);
  });

  test("lets errors and rich values reach the functions", () => {
    expect(json.allowErrorForDataTypeAny && json.allowCustomDataForDataTypeAny).toBe(true);
  });

  test("offers units that are units of the kind, the result's own among them", () => {
    for (const definition of definitions) {
      if (definition.form !== "number") continue;
      const { kind } = definition.result.quantity;
      const result = json.functions.find(({ id }) => id === definition.name)!.parameters.at(-1)!;
      if (result.repeating) continue;
      const { values } = json.enums.find(({ id }) => id === result.customEnumId)!;
      const units = values.map(({ stringValue }) => readUnit(stringValue));
      for (const unit of units) expect(isProblem(unit) || unit.kind).toBe(kind);
      expect(values.map(({ stringValue }) => stringValue)).toContain(definition.result.unit);
    }
  });

  test("offers the words that an input takes", () => {
    expect(json.enums.find(({ id }) => id === "BARY.model")!.values.map(({ stringValue }) => stringValue)).toEqual([
      "relativistic",
      "linear",
    ]);
    expect(json.functions.find(({ id }) => id === "AIR")!.parameters[1]!.customEnumId).toBe("BARY.formula");
  });

  test("leaves headers and result to an argument that repeats", () => {
    const [noise, ...more] = json.functions.find(({ id }) => id === "NOISESUM")!.parameters;
    expect(more).toEqual([]);
    expect(noise).toMatchObject({ name: "noise", repeating: true, type: "any", dimensionality: "matrix" });
    expect(noise!.description).toContain("Then the header cells");
  });

  test("leads to a paragraph of help that is there", async () => {
    const { helpPage } = await import("../../src/catalog/helpPage.js");
    const page = helpPage();
    for (const { helpUrl } of json.functions) expect(page).toContain(`<section id="${helpUrl.split("#")[1]}">`);
  });
});

describe("the checks of functions.json find", () => {
  test("a function that was renamed", () => {
    const renamed = withFirst({ id: "CONVERT", name: "CONVERT" });
    expect(brokenPromises(promised, callLines(renamed))).toEqual([
      "no longer there: INTO(value, [headers], [result])",
      "not promised yet: CONVERT(value, [headers], [result])",
    ]);
  });

  test("arguments in another order", () => {
    const turned = withFirst({ parameters: [...json.functions[0]!.parameters].reverse() });
    expect(brokenPromises(promised, callLines(turned))).toHaveLength(2);
    expect(functionsJsonProblems(turned)).toEqual([
      "INTO: an argument that is needed follows one that may be left out",
    ]);
  });

  test.each([
    [{ id: "AB", name: "AB" }, "AB: id is not 3 to 64 capital letters and digits"],
    [{ id: "ABC1", name: "ABC1" }, "ABC1: id is a cell address"],
    [{ id: "BARY.INTO", name: "BARY.INTO" }, "BARY.INTO: id is not 3 to 64 capital letters and digits"],
    [{ id: "TAG", name: "TAG" }, "two functions TAG"],
    [
      {
        parameters: [
          { ...json.functions[0]!.parameters[0]!, repeating: true as const },
          json.functions[0]!.parameters[1]!,
        ],
      },
      "INTO: an argument that repeats is not the last",
    ],
    [{ name: "Into" }, "INTO: name is not its id"],
    [{ description: "x".repeat(1025) }, "INTO: description is not 1 to 1024 characters"],
    [{ helpUrl: "http://localhost/help.html" }, "INTO: help is not at an https address"],
  ])("%j", (change, problem) => {
    expect(functionsJsonProblems(withFirst(change))).toEqual([problem]);
  });

  test("what the schema refuses", () => {
    const { options: _, ...item } = json.functions[0]!;
    expect(schemaProblems("extensionFunction", { ...item, id: "AB" })).not.toEqual([]);
    expect(schemaProblems("extensionFunction", { ...item, description: "x".repeat(1025) })).not.toEqual([]);
    expect(schemaProblems("enum", { ...json.enums[0]!, type: "text" })).not.toEqual([]);
  });

  test("an enum that is not there", () => {
    expect(functionsJsonProblems({ ...json, enums: json.enums.slice(1) })).not.toEqual([]);
  });
});
