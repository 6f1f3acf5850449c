import { describe, expect, test } from "vitest";
import type { CellFunction } from "../../src/call/cellFunction.js";
import { columnOf } from "../../src/call/column.js";
import { bookOf } from "../../src/sheet/book/bookOf.js";
import { listProblems } from "../../src/sheet/book/listProblems.js";
import { usedColumns, usedRows } from "../../src/sheet/book/usedRows.js";
import { change, changeInSlices, changeWatched } from "../../src/sheet/change.js";
import { fillFormula } from "../../src/sheet/edit/fillFormula.js";
import { setCells } from "../../src/sheet/edit/setCells.js";
import { setColumn } from "../../src/sheet/edit/setColumn.js";
import { noFunctions } from "../../src/sheet/formula/functions.js";
import { at, bookAfter, down, edited, typed, valueAt } from "./grid.js";

const rows = 50_000;
const start = bookOf([{ name: "Sheet1", columns: [columnOf(Array.from({ length: rows }, (_, row) => row))] }]);
const fills = [1, 2, 3].map((column) => fillFormula({ sheet: 0, column, from: 0, to: rows }, "=A1+1"));

describe("a change under watch", () => {
  test("tells how far it is and ends with all of it", () => {
    const told: [number, number][] = [];
    const book = changeWatched(start, fills, noFunctions, { onProgress: (done, total) => told.push([done, total]) });
    expect(book && valueAt(book, "D50000")).toBe(rows);
    expect(told.length).toBeGreaterThan(10);
    expect(told.every(([done], index) => index === 0 || done > (told[index - 1] as [number, number])[0])).toBe(true);
    expect(told.at(-1)).toEqual([3 * rows, 3 * rows]);
  });

  test("cancelled half way leaves the book as it was", () => {
    let seen = 0;
    const book = changeWatched(start, fills, noFunctions, { isCancelled: () => ++seen > 3 });
    expect(book).toBeUndefined();
    expect(seen).toBe(4);
    expect(valueAt(start, "A50000")).toBe(rows - 1);
    expect(valueAt(start, "B1")).toBeNull();
  });

  test("in slices gives the same and can be cancelled from outside", async () => {
    const whole = await changeInSlices(start, fills, noFunctions, {});
    expect(whole && down(whole, "D49999", 2)).toEqual([rows - 1, rows]);
    let cancelled = false;
    const running = changeInSlices(start, fills, noFunctions, { isCancelled: () => cancelled });
    cancelled = true;
    expect(await running).toBeUndefined();
  });
});

describe("a recalculation", () => {
  /** Counts the rows it is asked for. */
  function counting() {
    const asked: number[] = [];
    const counted: CellFunction = {
      name: "TEST.COUNTED",
      leastArguments: 1,
      mostArguments: 1,
      once: ([input]) => {
        asked.push(1);
        return input?.block ?? { rows: 1, columns: [columnOf([null])] };
      },
      eachRow: (count, [input]) => {
        asked.push(count);
        return { rows: count, columns: input && "perRow" in input ? input.perRow : [] };
      },
    };
    const functions = {
      cellFunction: (name: string) => (name === counted.name ? counted : undefined),
      cellFunctionNames: () => [counted.name],
    };
    return { asked, functions };
  }

  test("touches the rows that depend on what changed and no others", () => {
    const { asked, functions } = counting();
    const filled = change(
      start,
      [fillFormula({ sheet: 0, column: 1, from: 0, to: rows }, "=TEST.COUNTED(A1)")],
      functions,
    );
    expect(asked.reduce((sum, each) => sum + each, 0)).toBe(rows);
    const rowsAsked = (edit: Parameters<typeof change>[1][number]): number => {
      asked.length = 0;
      change(filled, [edit], functions);
      return asked.reduce((sum, each) => sum + each, 0);
    };
    expect(rowsAsked(setCells(at("A777"), [[1]]))).toBe(1);
    expect(rowsAsked(setCells(at("C777"), [[1]]))).toBe(0);
    expect(rowsAsked(setColumn(at("A100"), columnOf([1, 2, 3])))).toBe(3);
    expect(rowsAsked(setCells(at("B5"), [[null]]))).toBe(0);
    expect(asked).toEqual([]);
  });

  test("of fixed, growing and moving ranges follows the range", () => {
    const { asked, functions } = counting();
    const text = ["=TEST.COUNTED(A1)+A$1", "=TEST.COUNTED(A1)+SUM(A$1:A1)", "=TEST.COUNTED(A1)+SUM(A1:A3)"];
    const counts = text.map((formula) => {
      const filled = change(start, [fillFormula({ sheet: 0, column: 1, from: 0, to: 100 }, formula)], functions);
      return ["A1", "A50"].map((address) => {
        asked.length = 0;
        change(filled, [setCells(at(address), [[-1]])], functions);
        return asked.reduce((sum, each) => sum + each, 0);
      });
    });
    expect(counts).toEqual([
      [100, 1],
      [100, 51],
      [1, 3],
    ]);
  });
});

describe("problems of a book", () => {
  test("are counted by topic with their first cell", () => {
    const book = bookAfter(typed("A1", [1, "=1/A1"], [0, "=1/A2"], [0, "=1/A3"], ["x", "=1/A4"], [5, "=NOSUCH(A5)"]));
    expect(listProblems(book).map(({ code, count, address }) => [code, count, address])).toEqual([
      ["#DIV/0!", 2, "B2"],
      ["#VALUE!", 1, "B4"],
      ["#NAME?", 1, "B5"],
    ]);
    expect(listProblems(book, { sheet: 0, column: 1, from: 0, to: 2 })).toHaveLength(1);
    expect(listProblems(edited(book, [typed("B2", [1])]))[0]).toMatchObject({ count: 1, address: "B3" });
  });

  test("an empty book has none, and no rows", () => {
    const empty = bookOf([{ name: "Sheet1", columns: [] }]);
    expect([listProblems(empty), usedRows(empty, 0), usedColumns(empty, 0), usedRows(empty, 5)]).toEqual([[], 0, 0, 0]);
    expect(edited(empty, [])).toEqual(empty);
  });
});

describe("cells keep what was typed", () => {
  test("texts that look like numbers, the smallest and negative zero", () => {
    const book = bookAfter(typed("A1", ["007", 1e-300, -0, "", true], ["=A1", "=B1*1", "=C1*1", "=D1", "=E1"]));
    expect(["A1", "B1", "D1", "E1"].map((each) => valueAt(book, each))).toEqual(["007", 1e-300, "", true]);
    expect(["A2", "B2", "D2", "E2"].map((each) => valueAt(book, each))).toEqual(["007", 1e-300, "", true]);
    expect([Object.is(valueAt(book, "C1"), -0), Object.is(valueAt(book, "C2"), -0)]).toEqual([true, true]);
  });
});
