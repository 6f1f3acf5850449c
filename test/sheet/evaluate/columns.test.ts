import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";
import { cellFunctionNames, findCellFunction } from "../../../src/call/cellFunctions.js";
import { cellsOf, columnOf } from "../../../src/call/column.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { cellOf } from "../../../src/sheet/book/cellOf.js";
import { readColumn } from "../../../src/sheet/book/readColumn.js";
import { resultWidth } from "../../../src/sheet/book/resultWidth.js";
import { calc } from "../../../src/sheet/calc.js";
import { change } from "../../../src/sheet/change.js";
import { fillFormula } from "../../../src/sheet/edit/fillFormula.js";
import { setCells } from "../../../src/sheet/edit/setCells.js";
import type { Functions } from "../../../src/sheet/formula/functions.js";
import { noFunctions } from "../../../src/sheet/formula/functions.js";
import { sameCell } from "../../../src/sheet/history/changes.js";
import { findWorksheetFunction } from "../../../src/sheet/worksheetFunctions/findWorksheetFunction.js";
import { expectSettled } from "../model/settledBook.js";

const number = fc.oneof(
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.integer({ min: -4, max: 4 }),
  fc.constantFrom(-0, 1e-300, 1e308, 0.5),
);
const cell: fc.Arbitrary<Cell> = fc.oneof(
  { weight: 8, arbitrary: number },
  fc.constantFrom<Cell[]>(null, "x", "12", true, false, ""),
);
const column = fc.array(cell, { minLength: 24, maxLength: 24 });

const formulas = [
  "=A1+B1",
  "=A1-B1*2",
  "=A1/B1",
  "=A1^B1",
  "=-A1",
  "=+A1",
  "=A1%",
  "=A1&B1",
  "=A1=B1",
  "=A1<B1",
  "=A1>=2",
  "=A1",
  "=IF(A1>B1,A1,B1)",
  "=IF(A1,1)",
  "=IF(B1,,A1)",
  "=IFERROR(A1/B1,B1)",
  "=IFNA(A1,1)",
  "=AND(A1>0,B1>0)",
  "=NOT(A1)",
  "=ROUND(A1,2)",
  "=MAX(A1,B1,0)",
  "=SUM(A$1:A1)",
  "=SUM(A1:B1)",
  "=SUM(A$1:A$9)+B1",
  "=POWER(A1,B1)",
  "=LOG(A1,2)",
  "=LET(x,A1*2,x+x)",
  "=ROW()+A1",
  "=AVERAGE(A1:B2)",
  "=1/0+A1",
  "=SUM(A1#)",
  "=@A1:A9",
  "=IF(SUM(A$1:A$3)>0,A1,B1)",
];

describe("a formula filled down", () => {
  test("gives in every row the bits that it gives there alone", () => {
    fc.assert(
      fc.property(column, column, (a, b) => {
        const start = bookOf([{ name: "Sheet1", columns: [columnOf(a), columnOf(b)] }]);
        const fills = formulas.map((text, index) =>
          fillFormula({ sheet: 0, column: 2 + 2 * index, from: 0, to: 24 }, text),
        );
        expectSettled(change(start, fills, noFunctions), noFunctions);
      }),
      { numRuns: 60 },
    );
  });

  test("takes the same functions of one number as the library", () => {
    const names = [
      "ABS",
      "ACOS",
      "ASIN",
      "ASINH",
      "ATAN",
      "COS",
      "COSH",
      "EXP",
      "LN",
      "LOG10",
      "SIN",
      "SINH",
      "SQRT",
      "TAN",
      "TANH",
    ];
    fc.assert(
      fc.property(column, (cells) => {
        const start = bookOf([{ name: "Sheet1", columns: [columnOf(cells)] }]);
        const fills = names.map((name, index) =>
          fillFormula({ sheet: 0, column: 1 + index, from: 0, to: 24 }, `=${name}(A1)`),
        );
        const book = change(start, fills, noFunctions);
        for (const [index, name] of names.entries()) {
          for (const [row, given] of cells.entries()) {
            const alone = findWorksheetFunction(name)?.call([given]) as Cell;
            const held = cellOf(book, { sheet: 0, row, column: 1 + index });
            expect(sameCell(held, alone), `${name}(${given})`).toBe(true);
          }
        }
      }),
      { numRuns: 40 },
    );
  });

  test("of a running sum over many rows is the sum of each, to the bit", () => {
    const rows = 9_000;
    const numbers = Array.from({ length: rows }, (_, row) =>
      row % 7 === 3 ? "text" : Math.sin(row) * 10 ** (row % 12),
    );
    const start = bookOf([{ name: "Sheet1", columns: [columnOf(numbers)] }]);
    const book = change(start, [fillFormula({ sheet: 0, column: 1, from: 0, to: rows }, "=SUM(A$1:A1)")], noFunctions);
    for (const row of [0, 1, 17, 8191, 8192, 8999]) {
      const [[alone] = []] = cellsOf(calc(`=SUM(A1:A${row + 1})`, noFunctions, start));
      expect(cellOf(book, { sheet: 0, row, column: 1 })).toBe(alone);
    }
  });
});

describe("our own functions filled down", () => {
  const functions: Functions = { cellFunction: findCellFunction, cellFunctionNames: () => cellFunctionNames };
  const header = ["Period [d]", "Mass [solMass]", "sigma [solMass]", "m [jupiterMass]", "K [m/s]"];
  const rows: Cell[][] = [
    header,
    [4.23, 1.1, 0.1, 0.47],
    [300, 1, null, 2],
    [null, 1, 0.1, 1],
    ["x", 1, 0.1, 1],
    [10, -1, 0.1, 1],
  ];
  const start = change(
    bookOf([{ name: "Sheet1", columns: [] }]),
    [setCells({ sheet: 0, row: 0, column: 0 }, rows)],
    functions,
  );
  const span = { sheet: 0, column: 5, from: 1, to: 6 };
  const text = "=BARY.REFLEX(A2,B2:C2,D2,,,A$1:D$1,E$1)";

  test("fill value and sigma", () => {
    const book = change(start, [fillFormula(span, text)], functions);
    expect(resultWidth(book, span)).toBe(2);
    expectSettled(book, functions);
    expect(typeof cellOf(book, { sheet: 0, row: 1, column: 6 })).toBe("number");
  });

  test("give the bits and the sentences of single cells", () => {
    const filled = change(start, [fillFormula(span, text)], functions);
    for (let row = 1; row < 6; row++) {
      const alone = change(
        start,
        [setCells({ sheet: 0, row, column: 5 }, [[{ formula: text.replaceAll(/([A-D])2/g, `$1${row + 1}`) }]])],
        functions,
      );
      for (const column of [5, 6]) {
        const [one, other] = [alone, filled].map((book) => cellOf(book, { sheet: 0, row, column })) as [Cell, Cell];
        expect(sameCell(one, other), `row ${row}: ${one instanceof CellError ? one.message : one}`).toBe(true);
      }
    }
  });

  test("follow a change of the unit in a header", () => {
    const book = change(start, [fillFormula(span, text)], functions);
    const inEarths = change(book, [setCells({ sheet: 0, row: 0, column: 3 }, [["m [earthMass]"]])], functions);
    const [before, after] = [book, inEarths].map((each) => readColumn(each, span).numbers[0] as number) as [
      number,
      number,
    ];
    // IAU 2015 B3 nominal masses: GM of Jupiter 1.2668653e17, of Earth 3.986004e14, so 317.83 earths to a jupiter; the
    // planet's own mass matters in the 4th digit only.
    expect(before / after / (1.2668653e17 / 3.986004e14)).toBeCloseTo(1, 3);
  });
});
