import { readFileSync, writeFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import type { CallProblem } from "../../src/call/callProblem.js";
import { CellError } from "../../src/call/cell.js";
import { cellFunctionNames } from "../../src/call/cellFunctions.js";
import { call } from "./door.js";
import { goldenText } from "./goldenText.js";
import { messageCalls } from "./messageCalls.js";

const golden = new URL("messages.golden.txt", import.meta.url);

/** Every topic there is: the compiler refuses a list that lacks one. */
const topics: Record<CallProblem["about"], true> = {
  "too many arguments": true,
  missing: true,
  blank: true,
  "no unit": true,
  unit: true,
  "wrong kind": true,
  disagreement: true,
  "not a number": true,
  bound: true,
  "zero or blank": true,
  "beyond numbers": true,
  "uncertainty beyond numbers": true,
  word: true,
  lengths: true,
  shape: true,
  "header count": true,
  "header of another column": true,
  "no result": true,
  "result unit missing": true,
  "result unit": true,
  "result kind": true,
  "several rows": true,
  "no unit stated": true,
  "unknown name": true,
  count: true,
  "zero for blank": true,
  "count of columns": true,
  needed: true,
  "two frames": true,
  "no clock": true,
  "zero of date": true,
  "hours or degrees": true,
};

describe("the sentences", () => {
  // Read and approved by eye: BARYCELL_WRITE_GOLDEN=1 writes the file anew, and its difference is to be read.
  test("are those of the golden file", () => {
    const text = goldenText(messageCalls);
    if (process.env.BARYCELL_WRITE_GOLDEN === "1") writeFileSync(golden, text);
    expect(text).toBe(readFileSync(golden, "utf8"));
  });

  test("tell of every topic", () => {
    const told = new Set<string>(messageCalls.map(({ about }) => about));
    expect(Object.keys(topics).filter((topic) => !told.has(topic))).toEqual([]);
  });

  const own = messageCalls.filter(({ about, filledDown }) => about !== "passed on" && filledDown === undefined);
  test.each(own)("$about: $function $given", ({ about, function: name, given }) => {
    const errors = call(name, ...given)
      .flat()
      .filter((cell) => cell instanceof CellError);
    expect(errors.length).toBeGreaterThan(0);
    for (const { message, topic, code } of errors) {
      expect(topic.split(": ").slice(0, 2)).toEqual([name, about]);
      expect(message.length).toBeLessThanOrEqual(250);
      expect(message).toMatch(new RegExp(`^${name}: [^.].*[.?]$`));
      expect(message).not.toMatch(/invalid|please|NaN|undefined|null|Infinity|\bor or\b|\.\.|;;| {2}|\?\./i);
      // What to do stands after the semicolon.
      expect(message).toMatch(/; .|arguments were given, and it takes at most/);
      expect(code).toBe(about === "blank" || about === "missing" ? "#N/A" : "#VALUE!");
    }
  });

  test("come from every function", () => {
    const names = cellFunctionNames.map((name) => name.replace("BARY.", ""));
    for (const name of names) {
      const [[cell]] = call(name) as [[CellError]];
      expect(cell.code).toBe("#N/A");
      expect(cell.message).toMatch(new RegExp(`^${name}: \\S.* is missing; the arguments are `));
    }
  });
});
