import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { paintOf } from "../../../../../src/hosts/bench/page/editor/text/paintOf.js";
import { mayPick, pickedText } from "../../../../../src/hosts/bench/page/editor/text/pickedText.js";
import { referencesOf } from "../../../../../src/hosts/bench/page/editor/text/references.js";
import type { Area } from "../../../../../src/sheet/book/book.js";

const sheets = ["Targets", "More stars", "2023"];
const home = { sheet: 0, row: 4, column: 5 };
const area = (sheet: number, top: number, left: number, bottom = top, right = left): Area => ({
  sheet,
  top,
  left,
  bottom,
  right,
});

describe("references in the text", () => {
  test("the same cells have the same colour, however they are written", () => {
    const references = referencesOf("=B2+$B$2+C2+b2:b2+targets!B2+'More stars'!B2", home, sheets);
    expect(references.map(({ colour }) => colour)).toEqual([0, 0, 1, 0, 0, 2]);
  });

  test("the seventh takes the first colour again", () => {
    const references = referencesOf("=A1+B1+C1+D1+E1+F1+G1", home, sheets);
    expect(references.map(({ colour }) => colour)).toEqual([0, 1, 2, 3, 4, 5, 0]);
  });

  test("their cells, the upper left corner first", () => {
    const areas = referencesOf("=D9:B2+'more STARS'!A1+Gone!A1", home, sheets).map(({ area }) => area);
    expect(areas).toEqual([area(0, 1, 1, 8, 3), area(1, 0, 0), undefined]);
  });

  test("whole columns and rows reach over the sheet", () => {
    // 1,048,576 rows and 16,384 columns: the limits of worksheet files, from memory.
    const areas = referencesOf("=A:B+2:2", home, sheets).map(({ area }) => area);
    expect(areas).toEqual([area(0, 0, 0, 1_048_575, 1), area(0, 1, 0, 1, 16_383)]);
  });

  test("are painted in their colours, beside functions and texts", () => {
    const text = '=SUM(B2,"d")';
    expect(paintOf(text, referencesOf(text, home, sheets))).toEqual([
      { from: 1, to: 4, paint: "editor-function" },
      { from: 5, to: 7, paint: "editor-reference editor-reference-0" },
      { from: 8, to: 11, paint: "editor-text" },
    ]);
  });
});

describe("picked cells as text", () => {
  test.each([
    [area(0, 1, 1), "B2"],
    [area(0, 1, 1, 8, 3), "B2:D9"],
    [area(0, 0, 1, 0, 3), "B$1:D$1"],
    [area(0, 0, 4), "E$1"],
    [area(0, 0, 1, 1_048_575, 2), "B:C"],
    [area(0, 2, 0, 3, 16_383), "3:4"],
    [area(0, 0, 0, 1_048_575, 16_383), "1:1048576"],
    [area(1, 1, 1), "'More stars'!B2"],
    [area(2, 1, 1, 2, 1), "'2023'!B2:B3"],
    [area(1, 0, 1, 0, 2), "'More stars'!B$1:C$1"],
  ])("%j is %s", (picked, text) => {
    expect(pickedText(picked, home, sheets)).toBe(text);
  });

  test("a header needs no $ for a formula that stands among the headers", () => {
    expect(pickedText(area(0, 0, 1), { sheet: 0, row: 0, column: 5 }, sheets)).toBe("B1");
  });

  test("reads as the cells that were picked", () => {
    const row = fc.integer({ min: 0, max: 1_048_575 });
    const column = fc.integer({ min: 0, max: 16_383 });
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 2 }), row, row, column, column, (sheet, row, other, left, right) => {
        const picked = area(
          sheet,
          Math.min(row, other),
          Math.min(left, right),
          Math.max(row, other),
          Math.max(left, right),
        );
        const text = `=${pickedText(picked, home, sheets)}`;
        expect(referencesOf(text, home, sheets).map(({ area }) => area)).toEqual([picked]);
      }),
    );
  });
});

describe("where a reference may be picked", () => {
  // "|" is the caret, "[" and "]" are the ends of a selection.
  test.each([
    ["=|", true],
    ["=SUM(|", true],
    ["=SUM(|)", true],
    ["=SUM(B2, |)", true],
    ["=B2*|", true],
    ["=B2*|+1", true],
    ["=SUM([B2],C2)", true],
    ["=-|", true],
    ["=B2|", false],
    ["=|B2", false],
    ["=B2%|", false],
    ["=SUM(B2)|", false],
    ["=SU|M(B2)", false],
    ["=12|", false],
    ["|=", false],
    ["abc|", false],
    ['="a|b"', false],
    ["=SUM(|B2,C2)", false],
  ])("%s: %s", (marked, expected) => {
    const caret = marked.search(/[|[]/);
    const end = marked.includes("]") ? marked.indexOf("]") - 1 : caret;
    expect(mayPick(marked.replace(/[|[\]]/g, ""), caret, end)).toBe(expected);
  });
});
