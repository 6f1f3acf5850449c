import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { stepReferences } from "../../../../../src/hosts/bench/page/editor/text/stepReference.js";

function stepped(text: string, from = text.length, to = from): string {
  let result = text;
  for (const { from: start, to: end, insert } of stepReferences(text, from, to).toReversed()) {
    result = result.slice(0, start) + insert + result.slice(end);
  }
  return result;
}

function cycle(text: string, steps: number): string[] {
  const forms: string[] = [];
  let last = text;
  for (let step = 0; step < steps; step++) {
    last = stepped(last);
    forms.push(last);
  }
  return forms;
}

// The order of the four forms: common practice, no source.
describe("the forms of a reference", () => {
  test.each([
    ["=B2", ["=$B$2", "=B$2", "=$B2", "=B2"]],
    ["=1+b2", ["=1+$b$2", "=1+b$2", "=1+$b2", "=1+b2"]],
    ["=B2:D9", ["=$B$2:$D$9", "=B$2:D$9", "=$B2:$D9", "=B2:D9"]],
    ["='My stars'!B2", ["='My stars'!$B$2", "='My stars'!B$2", "='My stars'!$B2", "='My stars'!B2"]],
    ["=A:C", ["=$A:$C", "=A:C"]],
    ["=2:5", ["=$2:$5", "=2:5"]],
  ])("%s", (text, forms) => {
    expect(cycle(text, forms.length)).toEqual(forms);
  });

  test("a range whose ends differ takes one form", () => {
    expect(stepped("=$B2:D$9")).toBe("=B2:D9");
  });

  test("only the one at the caret", () => {
    expect(stepped("=B2+C2", 3)).toBe("=$B$2+C2");
    expect(stepped("=B2+C2", 4)).toBe("=B2+$C$2");
    expect(stepped("=B2+ 1", 6)).toBe("=B2+ 1");
  });

  test("all that are selected take the form after the first one's", () => {
    expect(stepped("=B2+C$2*A:A", 0, 11)).toBe("=$B$2+$C$2*$A:$A");
    expect(stepped("=$B$2+C2*$A:$A", 0, 14)).toBe("=B$2+C$2*A:A");
  });

  test("texts and names are left alone", () => {
    expect(stepped('="B2"')).toBe('="B2"');
    expect(stepped("=star_mass")).toBe("=star_mass");
  });

  test("four steps lead back, for any cell or range that begins without a $", () => {
    const letters = fc.integer({ min: 0, max: 700 }).map((number) => {
      const low = String.fromCharCode(65 + (number % 26));
      return number < 26 ? low : String.fromCharCode(64 + Math.floor(number / 26)) + low;
    });
    const cell = fc.tuple(letters, fc.integer({ min: 1, max: 1_048_576 })).map(([column, row]) => column + row);
    fc.assert(
      fc.property(cell, cell, fc.boolean(), (one, other, isRange) => {
        const text = isRange ? `=${one}:${other}` : `=${one}`;
        const forms = cycle(text, 4);
        expect(new Set(forms).size).toBe(4);
        expect(forms[3]).toBe(text);
      }),
    );
  });
});
