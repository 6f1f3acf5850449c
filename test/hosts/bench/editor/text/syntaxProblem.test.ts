import { describe, expect, test } from "vitest";
import {
  closedAtEnd,
  isUnfinished,
  syntaxProblem,
} from "../../../../../src/hosts/bench/page/editor/text/syntaxProblem.js";
import { checkFormula } from "../../../../../src/sheet/formula/readFormula.js";

const functions = { cellFunction: () => undefined, cellFunctionNames: () => [] };

describe("what cannot be entered", () => {
  test.each([
    ["=SUM(B2", 'formula: =SUM(B2 cannot be read at character 5: this "(" is never closed; add ")"'],
    ["=B2*", 'formula: =B2* cannot be read at character 5: nothing follows "*"; a number, cell or function is needed'],
    [
      "=B2 3",
      'formula: =B2 3 cannot be read at character 5: "3" does not belong here; an operator or a value is missing',
    ],
    ['="d', 'formula: ="d cannot be read at character 2: a text has no end; close it with ", for example "d"'],
    [
      "=SUM(B2;C2)",
      'formula: =SUM(B2;C2) cannot be read at character 8: arguments are separated by ",", for example =MAX(B2,C2)',
    ],
  ])("%s", (text, message) => {
    expect(syntaxProblem(text)?.message).toBe(message);
    // The worksheet would say the same of it.
    expect(checkFormula(text, functions)).toMatchObject({ message, position: syntaxProblem(text)!.position });
  });

  test("as many characters as a worksheet reads, and no more", () => {
    // 8192: the limit of worksheet files, from memory.
    const longest = `=${"1+".repeat(4095)}1`;
    expect(longest).toHaveLength(8192);
    expect(syntaxProblem(longest)).toBeUndefined();
    const problem = syntaxProblem(`${longest}2`);
    expect(problem?.message).toContain("it has 8193 characters; 8192 are the most");
    expect(problem?.message).toBe(checkFormula(`${longest}2`, functions)?.message);
  });

  test.each(["=", "", "12", "how fast", "=B2", "=unknown_name", "=NOSUCH(1)", "=1/0", "'=B2*"])("%s can be", (text) => {
    expect(syntaxProblem(text)).toBeUndefined();
  });
});

describe("brackets left open at the end", () => {
  test.each([
    ["=SUM(B2", "=SUM(B2)"],
    ["=SUM(B2,MAX(C2,D2", "=SUM(B2,MAX(C2,D2))"],
    ["=2*(1+3%", "=2*(1+3%)"],
    ["=SUM(B2,", "=SUM(B2,"],
    ["=SUM(", "=SUM("],
    ["=SUM(B2+", "=SUM(B2+"],
    ["=SUM(B2))", "=SUM(B2))"],
    ["=SUM(B2;C2", "=SUM(B2;C2"],
    ['=SUM("B2', '=SUM("B2'],
    ["=B2", "=B2"],
    ["SUM(B2", "SUM(B2"],
  ])("%s is entered as %s", (text, entered) => {
    expect(closedAtEnd(text)).toBe(entered);
  });
});

test.each([
  ["=B2*", 4, true],
  ["=SUM(", 5, true],
  ["=SUM(B2, ", 9, true],
  ["=B2*", 2, false],
  ["=SUM(B2", 7, true],
  ["=SUM(B2)", 8, false],
  ["=B2", 3, false],
  ["=", 1, false],
])("%s is on its way at %i: %s", (text, caret, expected) => {
  expect(isUnfinished(text, caret)).toBe(expected);
});
