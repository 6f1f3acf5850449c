import fc from "fast-check";
import { expect, test } from "vitest";
import { cellOfField } from "../../../src/files/cell/cellOfField.js";
import { fieldOfCell } from "../../../src/files/cell/fieldOfCell.js";

/** Where no other source is named: the promise this project makes about text files. */
const cells: [field: string, cell: number | string | boolean | null, source: string][] = [
  ["4.23", 4.23, "decimal point number"],
  ["1e-300", 1e-300, "exponent"],
  ["1.5E+3", 1500, "exponent with sign"],
  [".5", 0.5, "no digit before the point"],
  ["5.", 5, "no digit after the point"],
  ["+7", 7, "leading plus"],
  ["-0", -0, "IEEE 754 keeps the sign of zero"],
  ["-0.000", -0, "IEEE 754 keeps the sign of zero"],
  ["  12.5 ", 12.5, "surrounding blanks"],
  ["\u00a012.5", 12.5, "surrounding blanks, no-break space"],
  ["0", 0, "zero is no identifier"],
  ["05.25", 5.25, "seconds of a fixed-width coordinate, common practice, no source"],
  ["5e-324", 5e-324, "smallest subnormal double, IEEE 754"],
  ["1.7976931348623157e308", Number.MAX_VALUE, "largest double, IEEE 754"],
  ["9007199254740993.0", 9007199254740992, "2^53 + 1 rounds to even, IEEE 754"],
  ["9007199254740991", 9007199254740991, "2^53 - 1 is a double"],
  ["100000000000000000000", 1e20, "5^20 < 2^53, so 10^20 is a double"],
  ["000000000000000000000", "000000000000000000000", "leading zeros"],
  ["", null, "blank"],
  ["   ", null, "blank"],
  ["TRUE", true, "exactly TRUE"],
  ["FALSE", false, "exactly FALSE"],
  ["True", "True", "not exactly TRUE"],
  [" TRUE", " TRUE", "not exactly TRUE"],
  ["007", "007", "identifier with leading zeros"],
  ["-007", "-007", "identifier with leading zeros"],
  ["00", "00", "identifier with leading zeros"],
  ["9007199254740993", "9007199254740993", "2^53 + 1 is no double"],
  ["4472832130942575872", "4472832130942575872", "2^53 < it, 19 digits: an identifier, though 512 times an odd number"],
  ["10000000000000000000000001", "10000000000000000000000001", "no double"],
  ["1e400", "1e400", "beyond the largest double"],
  ["-1e400", "-1e400", "beyond the largest double"],
  ["1e-400", "1e-400", "below the smallest double"],
  ["0e-400", 0, "zero, whatever the exponent"],
  ["1,5", "1,5", "decimal comma"],
  ["0x10", "0x10", "hexadecimal"],
  ["Infinity", "Infinity", "word"],
  ["NaN", "NaN", "word"],
  ["1e", "1e", "no exponent"],
  ["1e+", "1e+", "no exponent"],
  ["1e5.5", "1e5.5", "no exponent"],
  ["e5", "e5", "no digits"],
  [".", ".", "no digits"],
  ["-", "-", "no digits"],
  ["1.2.3", "1.2.3", "two points"],
  ["1 2", "1 2", "blank inside"],
  ["4.23 d", "4.23 d", "quantity text"],
  ["\u22125", "\u22125", "minus sign that is no hyphen"],
  ["51 Peg ", "51 Peg ", "RFC 4180 section 2.4: spaces are part of a field"],
];

test.each(cells)("%j is %j: %s", (field, cell) => {
  expect(cellOfField(field)).toBe(cell);
});

const written: [cell: number | boolean | null, field: string][] = [
  [0.1, "0.1"],
  [-0, "-0"],
  [1e21, "1e+21"],
  [9007199254740991, "9007199254740991"],
  [2 ** 60, "1.152921504606847e+18"],
  [true, "TRUE"],
  [null, ""],
];

test.each(written)("%j is written %j", (cell, field) => {
  expect(fieldOfCell(cell)).toBe(field);
});

test("every double comes back to the last bit, sign of zero included", () => {
  fc.assert(
    fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
      expect(cellOfField(fieldOfCell(value))).toBe(value);
    }),
    { numRuns: 1000 },
  );
});

test("decimal text reads as the nearest double (ECMA-262 StringToNumber, another implementation)", () => {
  const digits = (most: number) => fc.string({ unit: fc.constantFrom(..."0123456789"), minLength: 1, maxLength: most });
  fc.assert(
    fc.property(digits(18), digits(18), fc.integer({ min: -40, max: 40 }), (whole, decimals, exponent) => {
      const text = `${whole}.${decimals}e${exponent}`;
      expect(cellOfField(text)).toBe(Number(text));
    }),
    { numRuns: 1000 },
  );
});

test("a number read from an integer says what the integer said", () => {
  fc.assert(
    fc.property(fc.bigInt({ min: -(2n ** 70n), max: 2n ** 70n }), (integer) => {
      const cell = cellOfField(String(integer));
      expect(typeof cell === "number" ? BigInt(cell) : BigInt(cell as string)).toBe(integer);
    }),
    { numRuns: 1000 },
  );
});
