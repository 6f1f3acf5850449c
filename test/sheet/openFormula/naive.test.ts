import { expect, it } from "vitest";
import { naiveFormula } from "../naive/naiveEvaluate.js";
import { readCases } from "./readCases.js";
import { corpusFiles, runCorpus } from "./runCorpus.js";

runCorpus("cell by cell", naiveFormula);

it("holds more than 400 cases, each with its section and source", () => {
  const cases = corpusFiles.flatMap(readCases);
  expect(cases.length).toBeGreaterThanOrEqual(400);
  expect(cases.every((each) => /^(\d+(\.\d+)+|-)$/.test(each.section))).toBe(true);
});
