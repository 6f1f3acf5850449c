import { expect, test } from "vitest";
import { describeUnits } from "../../src/catalog/describeUnits.js";
import { ambiguousUnits } from "../../src/units/ambiguousUnits.js";
import { isProblem } from "../../src/units/problem.js";
import { readUnit } from "../../src/units/readUnit.js";
import { unitTable } from "../../src/units/unitTable.js";

const lines = describeUnits();
const refusedFrom = lines.indexOf("More than one meaning, refused");
const symbolOf = (line: string) => /^ {2}(\S+)/.exec(line)?.[1] ?? "";

test("every unit of the table has one line: symbol, whether it takes prefixes, meaning, other spellings, source", () => {
  for (const row of unitTable) {
    const own = lines.slice(0, refusedFrom).filter((line) => symbolOf(line) === row.symbol);
    expect(own, row.symbol).toHaveLength(1);
    const line = own[0]!;
    expect(line.startsWith(`  ${row.symbol} +`)).toBe(row.prefixes);
    expect(line).toContain(` ${row.meaning}`);
    expect(line.endsWith(` [${row.source}]`)).toBe(true);
    for (const spelling of [...row.spellings, ...row.words]) {
      expect(line.split(/; also |, | \[/), spelling).toContain(spelling);
    }
  }
});

test("each paragraph is of one kind, and no kind has two", () => {
  const headings = lines.filter((line) => /^An? /.test(line));
  expect(new Set(headings).size).toBe(headings.length);
  // Heads the table's own rows: a duration, a length, a mass and a speed are what the functions need.
  for (const kind of ["A duration", "A length", "A mass", "An angle", "A plain number"])
    expect(headings).toContain(kind);
});

test("what is refused stands there with choices that are read", () => {
  const refused = lines.slice(refusedFrom + 1, lines.indexOf("", refusedFrom));
  expect(refused.map(symbolOf)).toEqual(Object.keys(ambiguousUnits));
  for (const line of refused) {
    const choices = line.slice(line.indexOf("write ") + "write ".length).split(" or ");
    for (const choice of choices)
      expect(isProblem(readUnit(choice.slice(0, choice.indexOf(" (")))), choice).toBe(false);
  }
});

test("what the line on products and powers shows is read", () => {
  const line = lines.find((text) => text.startsWith("Products and powers: "))!;
  const shown = line.replace("Products and powers: ", "").split(/; logarithms: |, /);
  expect(shown.length).toBeGreaterThan(6);
  for (const text of shown) expect(isProblem(readUnit(text)), text).toBe(false);
});
