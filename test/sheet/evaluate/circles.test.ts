import { describe, expect, test } from "vitest";
import type { Edit } from "../../../src/sheet/edit/draft.js";
import { fillCells } from "../../../src/sheet/edit/fillCells.js";
import { fillFormula } from "../../../src/sheet/edit/fillFormula.js";
import { bookAfter, down, edited, messageAt, typed, valueAt } from "../grid.js";

describe("circles", () => {
  test("are named, in every cell of the circle", () => {
    const book = bookAfter(typed("A2", ["=B2", "=A2+1"], ["=A2", "=IFERROR(A2,7)"]));
    expect(messageAt(book, "A2")).toContain("A2 -> B2 -> A2");
    expect(messageAt(book, "B2")).toContain("A2 -> B2 -> A2");
    expect(valueAt(book, "A2")).toBe("#VALUE!");
    expect(valueAt(book, "A3")).toBe("#VALUE!");
    expect(valueAt(book, "B3")).toBe(7);
  });

  test("of one cell, of a cell in its own range, and over a filled column", () => {
    expect(messageAt(bookAfter(typed("A1", ["=A1+1"])), "A1")).toContain("A1 -> A1");
    expect(messageAt(bookAfter(typed("A3", ["=SUM(A1:A9)"])), "A3")).toContain("A3 -> A3");
    const filled = bookAfter(fillFormula({ sheet: 0, column: 0, from: 0, to: 5 }, "=B1"), typed("B1", ["=A3"]));
    expect(down(filled, "A1", 5)).toEqual([0, 0, 0, 0, 0]);
    expect(valueAt(edited(filled, [typed("B3", ["=A1"])]), "A2")).toBe(0);
    expect(messageAt(edited(filled, [typed("B3", ["=A1"])]), "A1")).toContain("A1 -> B1 -> A3 -> B3 -> A1");
  });

  test("are gone when one of their cells is", () => {
    const book = edited(bookAfter(typed("A1", ["=B1", "=C1", "=A1", "=C1+1"])), [typed("B1", [5])]);
    expect(["A1", "B1", "C1", "D1"].map((each) => valueAt(book, each))).toEqual([5, 5, 5, 6]);
  });

  test("of ten thousand cells end, in a sentence of at most 250 characters", () => {
    const book = bookAfter(fillFormula({ sheet: 0, column: 0, from: 0, to: 10_000 }, "=A2"), typed("A10001", ["=A1"]));
    expect(valueAt(book, "A5000")).toBe("#VALUE!");
    expect(messageAt(book, "A5000").length).toBeLessThanOrEqual(250);
    expect(messageAt(book, "A1")).toContain("A1 -> A2 -> A3");
  });

  test("over what a formula fills", () => {
    const book = bookAfter(typed("B1", ["=C1:D1"]));
    expect(messageAt(book, "B1")).toContain("B1 -> B1");
    expect(valueAt(book, "C1")).toBeNull();
    const two = bookAfter(typed("A1", ["={1,2}+D1"]), typed("D1", ["=B1"]));
    expect(valueAt(two, "A1")).toBe("#VALUE!");
    expect(valueAt(edited(two, [typed("D1", [10])]), "B1")).toBe(12);
  });

  test("are no circles: rows that look at rows above or below, crosswise too", () => {
    const rows = { from: 1, to: 6 };
    const book = bookAfter(
      typed("A1", [1, 1, 0, 10]),
      fillFormula({ sheet: 0, column: 0, ...rows }, "=A1+B1"),
      fillFormula({ sheet: 0, column: 1, ...rows }, "=A2*2"),
      fillFormula({ sheet: 0, column: 2, ...rows }, "=SUM(C$1:C1)+1"),
      fillFormula({ sheet: 0, column: 3, ...rows }, "=D3+1"),
    );
    // Worked by hand: A2 = A1 + B1 = 2, B2 = 2 A2 = 4, A3 = 6, B3 = 12 ...
    expect(down(book, "A1", 6)).toEqual([1, 2, 6, 18, 54, 162]);
    expect(down(book, "C1", 6)).toEqual([0, 1, 2, 4, 8, 16]);
    expect(down(book, "D1", 6)).toEqual([10, 5, 4, 3, 2, 1]);
  });
});

describe("long chains", () => {
  test("ten thousand cells deep, down and across sheets of formulas that differ", () => {
    const downwards = bookAfter(typed("A1", [1]), fillFormula({ sheet: 0, column: 0, from: 1, to: 10_000 }, "=A1+1"));
    expect(valueAt(downwards, "A10000")).toBe(10_000);
    const upwards = bookAfter(typed("A10000", [1]), fillFormula({ sheet: 0, column: 0, from: 0, to: 9_999 }, "=A2+1"));
    expect(valueAt(upwards, "A1")).toBe(10_000);
    const texts = Array.from({ length: 10_000 }, (_, row) => [row === 0 ? 1 : `=A${row}+${row}`]);
    expect(valueAt(bookAfter(typed("A1", ...texts)), "A10000")).toBe(1 + (9_999 * 10_000) / 2);
  });

  test("16,384 columns across", () => {
    const book = bookAfter(typed("A1", [1]), fillAcross());
    expect(valueAt(book, "XFD1")).toBe(16_384);
    expect(valueAt(edited(book, [typed("A1", [2])]), "XFD1")).toBe(16_385);
  });
});

function fillAcross(): Edit {
  const first = typed("B1", ["=A1+1"]);
  const fill = fillCells({ sheet: 0, top: 0, bottom: 0, left: 1, right: 1 }, "right", 16_382);
  return (draft) => {
    first(draft);
    fill(draft);
  };
}
