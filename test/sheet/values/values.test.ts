import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";
import { dateFromSerial, serialFromDate } from "../../../src/sheet/values/calendar.js";
import { compareCells } from "../../../src/sheet/values/compareCells.js";
import { decimalOf, fixedText, numberOfDecimal, roundedDecimal } from "../../../src/sheet/values/decimal.js";
import { numberFromText } from "../../../src/sheet/values/numberFromText.js";
import { isMatrix, matrixOfRows } from "../../../src/sheet/values/operand.js";
import type { Operator } from "../../../src/sheet/values/operate.js";
import { negate, operate, percent } from "../../../src/sheet/values/operate.js";
import { operateOperands } from "../../../src/sheet/values/operateOperands.js";
import { partOf } from "../../../src/sheet/values/part.js";
import { textFromNumber } from "../../../src/sheet/values/textFromNumber.js";

const operators: readonly Operator[] = ["+", "-", "*", "/", "^", "&", "=", "<>", "<", "<=", ">", ">="];
const anyNumber = fc.double({ noNaN: true, noDefaultInfinity: true });
const plain = fc.oneof(anyNumber, fc.string(), fc.boolean(), fc.constant(null));
const anyCell: fc.Arbitrary<Cell> = fc.oneof(
  plain,
  fc.constantFrom(new CellError("#REF!", "t", "gone"), new CellError("#N/A", "t", "none")),
);

describe("operators", () => {
  it("give a cell for any two cells: no NaN, no Infinity, messages of 250 characters at most", () => {
    fc.assert(
      fc.property(fc.constantFrom(...operators), anyCell, anyCell, (operator, left, right) => {
        const result = operate(operator, left, right);
        if (typeof result === "number") {
          expect(Number.isFinite(result)).toBe(true);
        } else if (result instanceof CellError) {
          expect(result.message.length).toBeLessThanOrEqual(250);
        }
      }),
    );
  });

  // ISO/IEC 26300-3 section 3.2.3: an error among the arguments is the result; the first by choice.
  it("pass errors on, the left one first", () => {
    const [left, right] = [new CellError("#REF!", "t", "left"), new CellError("#N/A", "t", "right")];
    for (const operator of operators) {
      expect(operate(operator, left, right)).toBe(left);
      expect(operate(operator, 1, right)).toBe(right);
    }
    expect([negate(left), percent(left)]).toEqual([left, left]);
  });

  // IEEE 754: worksheet arithmetic on numbers is the arithmetic of doubles.
  it("do not round", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e100, max: 1e100, noNaN: true }),
        fc.double({ min: -1e100, max: 1e100, noNaN: true }),
        (a, b) => {
          expect(operate("+", a, b)).toBe(a + b);
          expect(operate("-", a, b)).toBe(a - b);
          expect(operate("*", a, b)).toBe(a * b);
        },
      ),
    );
  });

  it("name the side and quote what came", () => {
    const message = (operator: Operator, left: Cell, right: Cell) =>
      (operate(operator, left, right) as CellError).message;
    expect(message("+", "abc", 1)).toBe(
      '"+": left side is "abc", a text that is no number; a number is needed, for example 4.2',
    );
    expect(message("/", 3, null)).toBe(
      '"/": right side of 3 / blank is zero or blank; a number other than 0 is needed',
    );
    expect(message("^", -8, 0.5)).toMatch(/^"\^": base is -8, exponent 0\.5; a base of 0 or more is needed/);
  });
});

describe("comparison", () => {
  // Section 6.4.9 asks for an order: of any two one holds, and it does not turn on itself.
  it("is an order", () => {
    fc.assert(
      fc.property(
        fc.oneof(anyNumber, fc.string(), fc.boolean()),
        fc.oneof(anyNumber, fc.string(), fc.boolean()),
        fc.oneof(anyNumber, fc.string(), fc.boolean()),
        (a, b, c) => {
          expect(Math.sign(compareCells(a, b)) + Math.sign(compareCells(b, a))).toBe(0);
          const [x, y, z] = [a, b, c].sort(compareCells) as [string, string, string];
          expect(compareCells(x, y)).toBeLessThanOrEqual(0);
          expect(compareCells(y, z)).toBeLessThanOrEqual(0);
          expect(compareCells(x, z)).toBeLessThanOrEqual(0);
        },
      ),
    );
  });
});

describe("numbers and texts", () => {
  it("read back as the same double", () => {
    fc.assert(
      fc.property(anyNumber, (value) => {
        expect(numberFromText(textFromNumber(value))).toBe(value === 0 ? 0 : value);
      }),
    );
  });

  it.each([
    ["12", 12],
    ["-.5", -0.5],
    ["5.", 5],
    ["1e3", 1000],
    ["1,234", 1234],
    ["12,34", undefined],
    ["1 2", undefined],
    ["0x10", undefined],
    ["Infinity", undefined],
    ["", undefined],
    ["%", undefined],
    ["5 %", 0.05],
    ["1e400", undefined],
    ["1900-03-01", 61],
    ["2024-13-01", undefined],
    ["12:60", undefined],
    ["1:30 PM", 0.5625],
    ["2024-05-01T06:00", 45413.25],
  ] as const)("%s is %s", (text, value) => {
    expect(numberFromText(text)).toBe(value);
  });
});

describe("decimals", () => {
  // The language's own toFixed rounds the exact binary value; away from halves both must agree.
  it("agree with toFixed away from halves", () => {
    fc.assert(
      fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.integer({ min: 0, max: 6 }), (value, places) => {
        const scaled = Math.abs(value) * 10 ** places;
        fc.pre(Math.abs(scaled - Math.floor(scaled) - 0.5) > 1e-6);
        expect(fixedText(roundedDecimal(decimalOf(value), places), places)).toBe(Math.abs(value).toFixed(places));
      }),
    );
  });

  it("hold every double", () => {
    fc.assert(
      fc.property(anyNumber, (value) => {
        expect(numberOfDecimal(decimalOf(value)) - value).toBe(0);
      }),
    );
  });
});

describe("calendar", () => {
  // From serial 61 on days count as the proleptic Gregorian calendar of the language has them.
  it("agrees with the language from March 1900 on", () => {
    fc.assert(
      fc.property(fc.integer({ min: 61, max: 2_958_465 }), (serial) => {
        const date = new Date(Date.UTC(1899, 11, 30) + serial * 86_400_000);
        expect(dateFromSerial(serial)).toEqual({
          year: date.getUTCFullYear(),
          month: date.getUTCMonth() + 1,
          day: date.getUTCDate(),
        });
      }),
    );
  });

  it("gives every serial back", () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 2_958_465 }), (serial) => {
        const { year, month, day } = dateFromSerial(serial) as { year: number; month: number; day: number };
        expect(serialFromDate(year, month, day)).toBe(serial);
      }),
    );
  });
});

describe("rectangles", () => {
  const table = matrixOfRows([
    [1, "a", null],
    [true, 2, 3],
  ]);

  it("share their cells with their parts", () => {
    const part = partOf(table, 1, 1, 1, 2);
    expect([part.rows, part.columns, part.at(0, 0), part.at(0, 1)]).toEqual([1, 2, 2, 3]);
    expect(part.block?.columns[1]?.numbers[0]).toBe(3);
  });

  it("meet cell by cell, with #N/A where one ends", () => {
    const result = operateOperands("&", table, matrixOfRows([["x", "y"]]));
    expect(isMatrix(result) && [result.at(1, 0), result.at(0, 1), (result.at(0, 2) as CellError).code]).toEqual([
      "TRUEx",
      "ay",
      "#N/A",
    ]);
  });
});
