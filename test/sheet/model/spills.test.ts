import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Book } from "../../../src/sheet/book/book.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { cellOf } from "../../../src/sheet/book/cellOf.js";
import { change } from "../../../src/sheet/change.js";
import { clearCells } from "../../../src/sheet/edit/clearCells.js";
import { deleteColumns } from "../../../src/sheet/edit/deleteColumns.js";
import { deleteRows } from "../../../src/sheet/edit/deleteRows.js";
import type { Edit } from "../../../src/sheet/edit/draft.js";
import { fillFormula } from "../../../src/sheet/edit/fillFormula.js";
import { insertColumns } from "../../../src/sheet/edit/insertColumns.js";
import { insertRows } from "../../../src/sheet/edit/insertRows.js";
import { moveCells } from "../../../src/sheet/edit/moveCells.js";
import { pasteCells } from "../../../src/sheet/edit/pasteCells.js";
import { EditRefused } from "../../../src/sheet/edit/refused.js";
import { setCells } from "../../../src/sheet/edit/setCells.js";
import { sortRows } from "../../../src/sheet/edit/sortRows.js";
import { pairFunctions } from "./pairFunction.js";
import { columnName } from "./references.js";
import { expectSettled } from "./settledBook.js";

interface Step {
  readonly says: string;
  readonly edit: (book: Book) => Edit;
}

/** Steps on a grid of 7 x 6 cells that begins at a row. */
function stepsAt(top: number): fc.Arbitrary<Step> {
  const row = fc.nat(6).map((each) => top + each);
  const column = fc.nat(5);
  const dollar = fc.constantFrom("", "", "$");
  const cell = fc.tuple(dollar, column, dollar, row).map(([a, c, b, r]) => `${a}${columnName(c)}${b}${r + 1}`);
  const formula = fc.oneof(
    cell.map((a) => `=${a}+1`),
    fc.tuple(cell, cell).map(([a, b]) => `=${a}:${b}`),
    fc.tuple(cell, cell).map(([a, b]) => `=${a}:${b}*2`),
    fc.tuple(cell, cell).map(([a, b]) => `=SUM(${a}:${b})`),
    fc.constantFrom("={1,2}", "={5;6;7}", "={1,2;3,4}"),
    cell.map((a) => `=TEST.PAIR(${a})`),
    cell.map((a) => `=TEST.PAIR(${a})*2`),
    fc.tuple(cell, cell).map(([a, b]) => `=IF(${a}>2,TEST.PAIR(${a}),${b})`),
    fc.tuple(cell, cell).map(([a, b]) => `=IFERROR(1/${a},TEST.PAIR(${b}))`),
    fc.tuple(cell, cell, cell).map(([a, b, c]) => `=IF(${a}>2,${b}:${c},${a})`),
    cell.map((a) => `=${a}#`),
    cell.map((a) => `=SUM(${a}#)`),
  );
  const area = fc.tuple(row, row, column, column).map(([a, b, c, d]) => ({
    sheet: 0,
    top: Math.min(a, b),
    bottom: Math.max(a, b),
    left: Math.min(c, d),
    right: Math.max(c, d),
  }));
  const literal = fc.oneof(fc.integer({ min: 0, max: 9 }), fc.constantFrom("x", null, null));
  return fc.oneof(
    {
      weight: 4,
      arbitrary: fc.tuple(row, column, literal).map(([r, c, value]) => ({
        says: `${columnName(c)}${r + 1} ${value}`,
        edit: () => setCells({ sheet: 0, row: r, column: c }, [[value]]),
      })),
    },
    {
      weight: 4,
      arbitrary: fc.tuple(row, column, formula).map(([r, c, text]) => ({
        says: `${columnName(c)}${r + 1} ${text}`,
        edit: () => setCells({ sheet: 0, row: r, column: c }, [[{ formula: text }]]),
      })),
    },
    {
      weight: 4,
      arbitrary: fc.tuple(row, row, column, formula).map(([a, b, c, text]) => ({
        says: `fill ${columnName(c)}${Math.min(a, b) + 1}..${Math.max(a, b) + 1} ${text}`,
        edit: () => fillFormula({ sheet: 0, column: c, from: Math.min(a, b), to: Math.max(a, b) + 1 }, text),
      })),
    },
    area.map((box) => ({ says: `clear ${JSON.stringify(box)}`, edit: () => clearCells(box) })),
    fc.tuple(area, row, column).map(([box, r, c]) => ({
      says: `copy ${JSON.stringify(box)} to ${columnName(c)}${r + 1}`,
      edit: (book: Book) => pasteCells({ book, area: box }, { sheet: 0, row: r, column: c }),
    })),
    fc.tuple(area, row, column).map(([box, r, c]) => ({
      says: `cut ${JSON.stringify(box)} to ${columnName(c)}${r + 1}`,
      edit: () => moveCells(box, { sheet: 0, row: r, column: c }),
    })),
    fc.tuple(area, fc.boolean()).map(([box, descending]) => ({
      says: `sort ${JSON.stringify(box)}`,
      edit: () => sortRows(box, [{ column: box.left, descending }]),
    })),
    row.map((r) => ({ says: `insert row ${r + 1}`, edit: () => insertRows(0, r, 1) })),
    row.map((r) => ({ says: `delete rows ${r + 1}`, edit: () => deleteRows(0, r, 2) })),
    column.map((c) => ({ says: `insert column ${columnName(c)}`, edit: () => insertColumns(0, c, 1) })),
    column.map((c) => ({ says: `delete column ${columnName(c)}`, edit: () => deleteColumns(0, c, 1) })),
  );
}

function runSteps(steps: readonly Step[]): void {
  let book = bookOf([{ name: "Sheet1", columns: [] }]);
  for (const step of steps) {
    try {
      book = change(book, [step.edit(book)], pairFunctions);
    } catch (thrown) {
      if (!(thrown instanceof EditRefused)) {
        throw thrown;
      }
    }
    expectSettled(book, pairFunctions);
  }
}

describe("formulas that fill several cells", () => {
  test("are at rest after any edits", () => {
    fc.assert(fc.property(fc.array(stepsAt(0), { minLength: 1, maxLength: 12 }), runSteps), {
      numRuns: Number(process.env.EDIT_SCRIPTS ?? 300),
    });
  });

  test("are at rest where the chunks of a column meet", () => {
    fc.assert(fc.property(fc.array(stepsAt(8188), { minLength: 1, maxLength: 8 }), runSteps), { numRuns: 40 });
  });

  test("blocked by a cell name it, and fill again when it is cleared", () => {
    const at = (row: number, column: number) => ({ sheet: 0, row, column });
    let book = bookOf([{ name: "Sheet1", columns: [] }]);
    book = change(
      book,
      [setCells(at(0, 0), [[{ formula: "={1;2;3}" }]]), setCells(at(2, 0), [["here"]])],
      pairFunctions,
    );
    expect(cellOf(book, at(0, 0))).toMatchObject({
      code: "#VALUE!",
      message: expect.stringContaining("A3 is in the way"),
    });
    expect(cellOf(book, at(1, 0))).toBeNull();
    book = change(book, [setCells(at(2, 0), [[null]])], pairFunctions);
    expect([0, 1, 2].map((row) => cellOf(book, at(row, 0)))).toEqual([1, 2, 3]);
  });

  test("are read whole by A1#, at whatever size they have", () => {
    const at = (row: number, column: number) => ({ sheet: 0, row, column });
    let book = bookOf([{ name: "Sheet1", columns: [] }]);
    book = change(
      book,
      [
        setCells(at(0, 2), [[3]]),
        setCells(at(0, 0), [[{ formula: "=SEQUENCE(C1)" }]]),
        setCells(at(0, 3), [[{ formula: "=SUM(A1#)" }]]),
      ],
      pairFunctions,
    );
    const sumAt = (rows: number) => cellOf(change(book, [setCells(at(0, 2), [[rows]])], pairFunctions), at(0, 3));
    // 1 + 2 + ... + n = n (n + 1) / 2
    expect([3, 1, 2, 10, 9000].map(sumAt)).toEqual([6, 1, 3, 55, 40_504_500]);
    const shorter = change(book, [setCells(at(0, 2), [[1]])], pairFunctions);
    expect([0, 1, 2].map((row) => cellOf(shorter, at(row, 0)))).toEqual([1, null, null]);
  });
});
