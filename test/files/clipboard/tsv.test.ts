import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { readTsv } from "../../../src/files/clipboard/readTsv.js";
import { writeTsv } from "../../../src/files/clipboard/writeTsv.js";

// RFC 4180, section 2, rules 5 to 7 for the quotes; that programs use them between tabs is common practice, no source.
describe("plain text of a clipboard", () => {
  test.each([
    [
      "a\tb\r\nc\td\r\n",
      [
        ["a", "b"],
        ["c", "d"],
      ],
    ],
    [
      "1\t2.5\n-3e-300\t.5",
      [
        [1, 2.5],
        [-3e-300, 0.5],
      ],
    ],
    ['"a\tb"\t"c\nd"\t"say ""x"""', [["a\tb", "c\nd", 'say "x"']]],
    ['5"\t"a"b\tc"', [['5"', '"a"b', 'c"']]],
    ['"never closed\tx', [['"never closed', "x"]]],
    [
      "a\t\tb\r\rc",
      [
        ["a", null, "b"],
        [null, null, null],
        ["c", null, null],
      ],
    ],
    ["a\t", [["a", null]]],
    ["=1+1\t007\t1234567890123456789\tTRUE\t1e400", [["=1+1", "007", "1234567890123456789", true, "1e400"]]],
    ["", []],
    ["\n", [[null]]],
  ])("%j", (text, rows) => {
    expect(readTsv(text)).toEqual(rows);
  });

  test("guards texts that a program would calculate", () => {
    expect(
      writeTsv([
        ["=1+1", "-", "@x", "a"],
        [-1, "", null, true],
      ]),
    ).toBe("'=1+1\t-\t'@x\ta\r\n-1\t\t\tTRUE");
  });

  test("comes back: doubles to the last bit, texts with tabs, line ends and quotes", () => {
    const text = fc.string({ unit: fc.constantFrom(..."ab \t\n\r\"'=;") }).filter((each) => each.trim() !== "");
    const cell = fc.oneof(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.boolean(), text);
    const rows = fc.integer({ min: 1, max: 4 }).chain((width) => fc.array(fc.array(cell, { minLength: width, maxLength: width }), { minLength: 1 })); // biome-ignore format: one arbitrary
    fc.assert(fc.property(rows, (each) => void expect(readTsv(writeTsv(each))).toStrictEqual(each)));
  });
});
