import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { ownFunctions } from "../../../src/files/xlsx/ownFunctions.js";
import { readWorkbook, readWorkbookAsStored } from "../../../src/files/xlsx/readWorkbook.js";
import { writeWorkbook } from "../../../src/files/xlsx/writeWorkbook.js";
import type { Book } from "../../../src/sheet/book/book.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { change } from "../../../src/sheet/change.js";
import type { NumberFormat } from "../../../src/sheet/display/numberFormat.js";
import type { Workbook, WorkbookSheet } from "../../../src/sheet/display/workbook.js";
import { plainWorkbookColumn, plainWorkbookSheet } from "../../../src/sheet/display/workbook.js";
import type { Edit } from "../../../src/sheet/edit/draft.js";
import { fillFormula } from "../../../src/sheet/edit/fillFormula.js";
import { defineName } from "../../../src/sheet/edit/names.js";
import { recalculate } from "../../../src/sheet/edit/recalculate.js";
import type { Entry } from "../../../src/sheet/edit/setCells.js";
import { setCells } from "../../../src/sheet/edit/setCells.js";
import { mostRows } from "../../../src/sheet/limits.js";
import { differences } from "./differences.js";
import { packageProblems } from "./packageProblems.js";

const sheetNames = ["Targets", "Two & <b>", "l'été 2"];

function bookAfter(edits: readonly Edit[]): Book {
  return change(bookOf(sheetNames.map((name) => ({ name, columns: [] }))), edits, ownFunctions);
}

const workbookOf = (book: Book, sheets: readonly WorkbookSheet[] = []): Workbook => ({ book, sheets, notes: [] });

async function comesBack(book: Book): Promise<void> {
  const bytes = await writeWorkbook(workbookOf(book));
  expect(packageProblems(bytes)).toEqual([]);
  const { book: back, notes } = await readWorkbook(bytes);
  expect(notes).toEqual([]);
  expect(differences(book, back)).toEqual([]);
  // And calculating it anew changes nothing.
  expect(differences(book, change(back, [recalculate()], ownFunctions))).toEqual([]);
}

const number = fc.oneof(
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.constantFrom(0, -0, 1e-300, 5e-324, 1.7976931348623157e308, 0.1 + 0.2, 1e21, 123456789012345680, 2 ** 53 + 2),
  fc.integer(),
);
const text = fc
  .oneof(
    fc.string({ unit: "binary", maxLength: 12 }),
    fc.string({ unit: fc.constantFrom(..."_x0041 \t\n\r\u0001\uD800\uFFFE&<>\"';é∞𝛼="), maxLength: 9 }),
    fc.constantFrom("", " ", "1234567890123456789", "007", "1e5", "TRUE", "=A1", "'x", "_x005F_", "]]>", "2024-01-01"),
  )
  .map((each) => each);
const value: fc.Arbitrary<Entry> = fc.oneof(number, text, fc.boolean(), fc.constant(null));

const cell = fc.tuple(fc.constantFrom(..."ABCDE"), fc.integer({ min: 1, max: 9 }), fc.constantFrom("", "$"), fc.constantFrom("", "$")).map(([letter, row, first, second]) => `${first}${letter}${second}${row}`); // biome-ignore format: one address
const range = fc.tuple(cell, cell).map(([a, b]) => `${a}:${b}`);
const elsewhere = fc.tuple(fc.constantFrom("Targets!", "'Two & <b>'!", "'l''été 2'!"), cell).map((parts) => parts.join("")); // biome-ignore format: one reference
const formula = fc
  .oneof(
    fc.tuple(cell, fc.constantFrom("+", "*", "&", ">", "^"), fc.oneof(cell, elsewhere)).map((parts) => parts.join("")),
    fc
      .tuple(fc.constantFrom("SUM", "MAX", "STDEV.S", "COUNT", "ROWS"), range)
      .map(([name, area]) => `${name}(${area})`),
    range.map((area) => `@${area}`),
    range.map((area) => `SUM(${area}*2)`),
    range.map((area) => `SORT(${area})`),
    fc.tuple(range, range).map(([a, b]) => `IF(${a}>1,${b},"<&\n""é")`),
    cell.map((each) => `LET(x,${each},y,2,x*y)+LET(z,1,z)`),
    cell.map((each) => `${each}#`),
    cell.map((each) => `IFERROR(1/${each},-star_mass)`),
    cell.map((each) => `BARY.INTO(${each},"d","h")`),
    cell.map((each) => `BARY.INTO("${each.length} ± 0.5 d",,"h")`),
    fc.constantFrom("ROW()", "1+", "SUM(A1", "NOPE(1)", "nope", "{1,2;3,4}", "SEQUENCE(2,3)", "#N/A", "1E400", "Gone!A1", "AND(A1)", "_x0041_&A1"), // biome-ignore format: one list
  )
  .map((each): Entry => ({ formula: `=${each}` }));

/** A formula that no file can hold comes back as the text that was typed. */
const isKept = (entry: Entry) =>
  !(
    typeof entry === "object" &&
    entry !== null &&
    "formula" in entry &&
    /1\+$|SUM\(A1$|1E400|Gone!/.test(entry.formula)
  );

const rows = (entry: fc.Arbitrary<Entry>) => fc.array(fc.array(entry, { minLength: 1, maxLength: 5 }), { minLength: 1, maxLength: 8 }); // biome-ignore format: one arbitrary

describe("a workbook that was written and read", () => {
  test("has the same values, formulas, filled cells, names and messages", async () => {
    const entry = fc.oneof(value, formula.filter(isKept));
    await fc.assert(
      fc.asyncProperty(rows(entry), rows(entry), rows(value), async (first, second, third) => {
        await comesBack(
          bookAfter([
            defineName("star_mass", "=Targets!$C$2", 0),
            defineName("täble", "='Two & <b>'!A1:B4", 0),
            defineName("light", "=299792.458", 0),
            setCells({ sheet: 0, row: 1, column: 0 }, third),
            setCells({ sheet: 0, row: 12, column: 1 }, first),
            setCells({ sheet: 1, row: 0, column: 0 }, second),
          ]),
        );
      }),
      { numRuns: 150 },
    );
  });

  test("has the same formulas filled down, with every kind of reference", async () => {
    const texts = ["=A2*2", "=A$2+A2", "=SUM(A$2:A2)", "=SUM($A$2:$A$9)", "=Targets!A2", "=A1048570", "=SUM(A:A)", "=BARY.INTO(A2,\"d\",\"h\")", "=SUM(A2:A$5)", "=A2&ROW()"]; // biome-ignore format: one list
    await fc.assert(
      fc.asyncProperty(
        fc.array(number, { minLength: 9, maxLength: 9 }),
        fc.array(fc.tuple(fc.constantFrom(...texts), fc.integer({ min: 1, max: 12 }), fc.integer({ min: 1, max: 9 })), { maxLength: 6 }), // biome-ignore format: one arbitrary
        async (numbers, fills) => {
          await comesBack(
            bookAfter([
              setCells(
                { sheet: 1, row: 1, column: 0 },
                numbers.map((each) => [each]),
              ),
              ...fills.map(([formulaText, from, count], index) =>
                fillFormula({ sheet: 1, column: index + 1, from, to: from + count }, formulaText),
              ),
            ]),
          );
        },
      ),
      { numRuns: 60 },
    );
  });

  test("keeps what cannot be a formula in a file as the text that was typed", async () => {
    const book = bookAfter([setCells({ sheet: 0, row: 0, column: 0 }, [["=1+", "=SUM(A1", "=Gone!A1", "=LEFT()"].map((each) => ({ formula: each }))])]); // biome-ignore format: one edit
    const { book: back } = await readWorkbook(await writeWorkbook(workbookOf(book)));
    expect(differences(bookAfter([setCells({ sheet: 0, row: 0, column: 0 }, [["=1+", "=SUM(A1", "=Gone!A1", "=LEFT()"]])]), back)).toEqual([]); // biome-ignore format: one comparison
  });

  test("gives the same bytes when it is written again", async () => {
    const book = bookAfter([
      setCells({ sheet: 0, row: 0, column: 0 }, [
        ["a", 1, true],
        [null, { formula: "=B1*2" }],
      ]),
    ]);
    const once = await writeWorkbook(workbookOf(book));
    const read = await readWorkbook(once);
    expect(await writeWorkbook(read)).toEqual(once);
  });
});

const format: fc.Arbitrary<NumberFormat> = fc.oneof(
  fc.record({ kind: fc.constant("fixed" as const), decimals: fc.nat(30), grouped: fc.boolean() }),
  fc.record({ kind: fc.constant("significant" as const), digits: fc.integer({ min: 1, max: 17 }) }),
  fc.record({ kind: fc.constant("scientific" as const), digits: fc.integer({ min: 1, max: 17 }) }),
  fc.record({ kind: fc.constant("percent" as const), decimals: fc.nat(30) }),
  fc.constant({ kind: "date" as const }),
  fc.record({ kind: fc.constantFrom("time" as const, "date-time" as const), decimals: fc.nat(9) }),
  fc.record({
    kind: fc.constantFrom("plus-minus" as const, "brackets" as const),
    digits: fc.constantFrom(1 as const, 2 as const, 3 as const, 4 as const, "PDG" as const),
  }),
);

describe("how a sheet is shown", () => {
  test("comes back: widths, hidden columns and sheets, frozen rows and columns, formats", async () => {
    const column = fc.record({
      width: fc.option(
        fc.double({ min: 0, max: 255, noNaN: true }).map((each) => each + 0),
        { nil: undefined },
      ),
      hidden: fc.boolean(),
      formats: fc.tuple(format, fc.nat(5), fc.integer({ min: 1, max: 9 }), fc.boolean()).map(([each, from, rows, isOpen]) => [{ from, to: isOpen ? mostRows : from + rows, format: each, code: undefined }]), // biome-ignore format: one arbitrary
    });
    await fc.assert(
      fc.asyncProperty(
        fc.array(column, { maxLength: 4 }),
        fc.nat(3),
        fc.nat(2),
        fc.boolean(),
        rows(value),
        async (columns, frozenRows, frozenColumns, hidden, cells) => {
          const end = columns.findLastIndex((each) => JSON.stringify(each) !== JSON.stringify(plainWorkbookColumn)) + 1;
          const shown = { hidden, frozenRows, frozenColumns, columns: columns.slice(0, end) };
          const book = bookAfter([setCells({ sheet: 1, row: 0, column: 0 }, cells)]);
          const bytes = await writeWorkbook(workbookOf(book, [plainWorkbookSheet, shown, plainWorkbookSheet]));
          expect(packageProblems(bytes)).toEqual([]);
          const back = await readWorkbook(bytes);
          expect(back.sheets).toEqual([plainWorkbookSheet, shown, plainWorkbookSheet]);
          expect(differences(book, back.book)).toEqual([]);
        },
      ),
      { numRuns: 120 },
    );
  });

  test("keeps the format code of a file where it says more than the format", async () => {
    const formats = [{ from: 1, to: 5, format: { kind: "fixed", decimals: 2, grouped: false } as const, code: '0.00" m/s"' }]; // biome-ignore format: one list
    const shown = { ...plainWorkbookSheet, columns: [{ ...plainWorkbookColumn, formats }] };
    const back = await readWorkbook(await writeWorkbook(workbookOf(bookAfter([]), [shown])));
    expect(back.sheets[0]).toEqual(shown);
  });
});

describe("reading as stored", () => {
  test("leaves formulas without a value blank, reading calculates them", async () => {
    const book = bookAfter([setCells({ sheet: 0, row: 0, column: 0 }, [[{ formula: "=B1" }, null]])]);
    const bytes = await writeWorkbook(workbookOf(book));
    expect(differences(book, (await readWorkbookAsStored(bytes)).book)).toEqual([]);
  });
});
