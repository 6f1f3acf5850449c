import { describe, expect, test } from "vitest";
import { describeFunction } from "../../src/catalog/describeFunction.js";
import { signature } from "../../src/catalog/signature.js";
import { definitions } from "../../src/functions/definitions.js";

/** Half a unit of the last digit of a number as printed: 0.005 for 0.09, 5e-20 for 7.67E-18. */
function halfUnit(printed: string): number {
  const [digits = "", exponent = "0"] = printed.toLowerCase().split("e");
  return 0.5 * 10 ** (Number(exponent) - (digits.split(".")[1]?.length ?? 0));
}

test("half a unit of the last digit", () => {
  expect(halfUnit("0.09")).toBeCloseTo(0.005, 15);
  expect(halfUnit("12.5")).toBeCloseTo(0.05, 15);
  expect(halfUnit("149597870700")).toBe(0.5);
  expect(halfUnit("7.67E-18") / 5e-21).toBeCloseTo(1, 12);
});

describe.each(definitions.map((definition) => [definition.name, definition] as const))("%s", (name, definition) => {
  const lines = describeFunction(definition);
  const section = (title: string) => {
    const from = lines.indexOf(title);
    const to = lines.indexOf("", from);
    return lines.slice(from + 1, to < 0 ? undefined : to);
  };

  test("everything of the definition is told, each thing once", () => {
    expect(lines[0]).toBe(signature(definition));
    expect(lines[0]).toMatch(new RegExp(`^BARY\\.${name}\\(.+\\)$`));
    expect(lines[2]).toBe(definition.question);
    const told = [
      definition.question,
      definition.formula,
      definition.source,
      ...(definition.note ? [definition.note] : []),
    ];
    for (const text of told) expect(lines.filter((line) => line.endsWith(text))).toHaveLength(1);
    for (const title of ["Inputs", "Examples"]) expect(lines.filter((line) => line === title)).toHaveLength(1);
    expect(lines.filter((line) => line.startsWith("Result   "))).toHaveLength(1);
  });

  test("every argument of the call has a line, in the order of the call", () => {
    const called = lines[0]!
      .slice(lines[0]!.indexOf("(") + 1, -1)
      .split(", ")
      .map((word) => word.replace(/[[\]]/g, ""))
      // An input that repeats has one line.
      .filter((word) => !word.endsWith("..."));
    const told = section("Inputs").map((line) => /^ {2}(\S+(?: \S+)*) {2,}\S/.exec(line)?.[1]);
    expect(told).toEqual(called);
  });

  test("the lines are fit for a terminal", () => {
    for (const line of lines) expect(line).not.toMatch(/undefined|\[object|NaN|[\t\n]| $/);
    expect(lines.join("\n")).not.toContain("\n\n\n");
  });

  test("each example, run, gives what its source says, within half a unit of the last digit printed there", () => {
    const told = section("Examples");
    expect(told.length).toBe(3 * definition.examples.length);
    for (const [index, { gives, because }] of definition.examples.entries()) {
      const [formula, answer, check] = told.slice(3 * index, 3 * index + 3) as [string, string, string];
      expect(formula).toMatch(new RegExp(`^ {2}=BARY\\.${name}\\(.*\\)$`));
      expect(check).toBe(`    check: ${gives} (${because})`);
      const found = answer.replace(/^ {4}= /, "");
      const [printed = "", unit = ""] = gives.split(" ");
      if (definition.form === "text" || Number.isNaN(Number(printed))) expect(found).toBe(gives);
      else {
        const [value = "", ...rest] = found.split(" ");
        expect(rest.join(" ")).toBe(unit);
        expect(Math.abs(Number(value) - Number(printed))).toBeLessThanOrEqual(halfUnit(printed));
      }
    }
  });
});
