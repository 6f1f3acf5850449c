import { describe, expect, test } from "vitest";
import { columnOf } from "../../../src/call/column.js";
import type { Book } from "../../../src/sheet/book/book.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { deleteRows } from "../../../src/sheet/edit/deleteRows.js";
import { fillFormula } from "../../../src/sheet/edit/fillFormula.js";
import { changes } from "../../../src/sheet/history/changes.js";
import { goTo, presentBook, record, redo, startHistory, undo } from "../../../src/sheet/history/history.js";
import { bookAfter, edited, typed, valueAt } from "../grid.js";

const told = (before: Book, after: Book) =>
  [...changes(before, after)].map(({ row, column, before: old, after: now }) => [
    `${String.fromCharCode(65 + column)}${row + 1}`,
    old.value,
    now.value,
    old.formula,
    now.formula,
  ]);

describe("history", () => {
  test("gives back the very books, by name, and forgets what was undone when something else is done", () => {
    const first = bookAfter(typed("A1", [1, "=A1*2"]));
    const second = edited(first, [typed("A1", [2])]);
    const third = edited(second, [deleteRows(0, 0, 1)]);
    let history = record(record(startHistory(first), "typed A1", second), "deleted row 1", third);
    expect(presentBook(undo(history))).toBe(second);
    expect(presentBook(undo(undo(undo(history))))).toBe(first);
    expect(presentBook(redo(undo(history)))).toBe(third);
    expect(presentBook(goTo(history, 0))).toBe(first);
    history = record(undo(history), "typed again", first);
    expect(history.versions.map(({ name }) => name)).toEqual(["opened", "typed A1", "typed again"]);
    expect(valueAt(presentBook(undo(history)), "B1")).toBe(4);
  });
});

describe("what changed", () => {
  test("is told with old and new, column by column, and nothing else", () => {
    const before = bookAfter(typed("A1", [1, "=A1*2", "=B1+0", "note"], [1, "=A2*2", "=B2+0"]));
    const after = edited(before, [typed("A1", [3])]);
    expect(told(before, after)).toEqual([
      ["A1", 1, 3, undefined, undefined],
      ["B1", 2, 6, "=A1*2", "=A1*2"],
      ["C1", 2, 6, "=B1+0", "=B1+0"],
    ]);
    expect(told(after, edited(after, [typed("A1", [3])]))).toEqual([]);
    expect(told(before, edited(before, [typed("B1", [2])]))).toEqual([["B1", 2, 2, "=A1*2", undefined]]);
  });

  test("counts errors that say something else", () => {
    const before = bookAfter(typed("A1", ["x", "=A1*2"]));
    const after = edited(before, [typed("A1", ["y"])]);
    expect(told(before, after).map(([address]) => address)).toEqual(["A1", "B1"]);
  });

  test("does not look at what a million rows share", () => {
    const column = { length: 1_000_000, numbers: new Float64Array(1_000_000).fill(2), others: undefined };
    const start = bookOf([{ name: "Sheet1", columns: [column, columnOf([])] }]);
    const before = edited(start, [fillFormula({ sheet: 0, column: 1, from: 0, to: 1_000_000 }, "=A1^2")]);
    const after = edited(before, [typed("A500000", [3])]);
    expect(told(before, after).map(([address, , now]) => [address, now])).toEqual([
      ["A500000", 3],
      ["B500000", 9],
    ]);
    const shared = after.sheets[0]?.columns[1]?.cells.chunks.filter(
      (chunk, index) => chunk === before.sheets[0]?.columns[1]?.cells.chunks[index],
    );
    expect(shared?.length).toBe((before.sheets[0]?.columns[1]?.cells.chunks.length as number) - 1);
  });
});
