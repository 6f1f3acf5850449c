import { describe, expect, test } from "vitest";
import { clearCells } from "../../../src/sheet/edit/clearCells.js";
import { deleteColumns } from "../../../src/sheet/edit/deleteColumns.js";
import { deleteRows } from "../../../src/sheet/edit/deleteRows.js";
import { fillCells } from "../../../src/sheet/edit/fillCells.js";
import { fillFormula } from "../../../src/sheet/edit/fillFormula.js";
import { insertColumns } from "../../../src/sheet/edit/insertColumns.js";
import { insertRows } from "../../../src/sheet/edit/insertRows.js";
import { moveCells } from "../../../src/sheet/edit/moveCells.js";
import { defineName, removeName } from "../../../src/sheet/edit/names.js";
import { pasteCells } from "../../../src/sheet/edit/pasteCells.js";
import { EditRefused } from "../../../src/sheet/edit/refused.js";
import { replaceText } from "../../../src/sheet/edit/replaceText.js";
import { setCells } from "../../../src/sheet/edit/setCells.js";
import { addSheet, removeSheet, renameSheet } from "../../../src/sheet/edit/sheets.js";
import { sortRows } from "../../../src/sheet/edit/sortRows.js";
import { textToNumber } from "../../../src/sheet/edit/textToNumber.js";
import { filterRows } from "../../../src/sheet/view/filterRows.js";
import { findCells } from "../../../src/sheet/view/findCells.js";
import { at, bookAfter, down, edited, formulaAt, messageAt, typed, valueAt } from "../grid.js";

const area = (from: string, to: string, sheet = 0) => {
  const [a, b] = [at(from), at(to)];
  return { sheet, top: a.row, left: a.column, bottom: b.row, right: b.column };
};

describe("inserting and deleting", () => {
  const book = bookAfter(
    typed("A1", ["m"], [1], [2], [3]),
    fillFormula({ sheet: 0, column: 1, from: 1, to: 4 }, "=A2*A$2"),
    typed("C1", ["=SUM(A2:A4)"]),
  );

  test("rows inside a range make it longer, rows above move it", () => {
    const wider = edited(book, [insertRows(0, 2, 2)]);
    expect(formulaAt(wider, "C1")).toBe("=SUM(A2:A6)");
    expect(down(wider, "B2", 5)).toEqual([1, null, null, 2, 3]);
    expect(formulaAt(wider, "B6")).toBe("=A6*A$2");
    expect(formulaAt(edited(book, [insertRows(0, 0, 1)]), "C2")).toBe("=SUM(A3:A5)");
  });

  test("what refers to deleted cells says so", () => {
    const shorter = edited(book, [deleteRows(0, 1, 1)]);
    expect(formulaAt(shorter, "B2")).toBe("=A2*#REF!");
    expect(valueAt(shorter, "B2")).toBe("#REF!");
    expect(messageAt(shorter, "B2")).toContain("deleted");
    expect(formulaAt(shorter, "C1")).toBe("=SUM(A2:A3)");
    expect(valueAt(shorter, "C1")).toBe(5);
    expect(formulaAt(edited(book, [deleteColumns(0, 0, 1)]), "B1")).toBe("=SUM(#REF!)");
  });

  test("columns move references by whole columns too", () => {
    const wider = edited(edited(book, [typed("D1", ["=SUM(A:A)"])]), [insertColumns(0, 0, 1)]);
    expect(formulaAt(wider, "E1")).toBe("=SUM(B:B)");
    expect(formulaAt(wider, "C3")).toBe("=B3*B$2");
    expect(valueAt(wider, "E1")).toBe(6);
  });

  test("is refused where cells would fall off the sheet", () => {
    const full = edited(book, [typed("A1048576", ["last"])]);
    expect(() => edited(full, [insertRows(0, 0, 1)])).toThrow(EditRefused);
    expect(() => edited(full, [insertRows(0, 0, 1)])).toThrow(/more than 1048576; fewer rows are needed/);
    const wide = edited(book, [typed("XFD1", ["last"])]);
    expect(() => edited(wide, [insertColumns(0, 3, 1)])).toThrow(/more than 16384/);
  });
});

describe("filling", () => {
  test("repeats values, and goes on with series when asked", () => {
    const book = bookAfter(typed("A1", [1, "x"], [3, "y"]));
    expect(down(edited(book, [fillCells(area("A1", "B2"), "down", 3)]), "A1", 5)).toEqual([1, 3, 1, 3, 1]);
    const series = edited(book, [fillCells(area("A1", "B2"), "down", 3, true)]);
    expect(down(series, "A1", 5)).toEqual([1, 3, 5, 7, 9]);
    expect(down(series, "B1", 5)).toEqual(["x", "y", "x", "y", "x"]);
    const up = edited(bookAfter(typed("A4", [10], [12])), [fillCells(area("A4", "A5"), "up", 3, true)]);
    expect(down(up, "A1", 3)).toEqual([4, 6, 8]);
    const right = edited(bookAfter(typed("A1", [1], ["=A1+1"])), [fillCells(area("A1", "A2"), "right", 2, true)]);
    expect([valueAt(right, "B1"), valueAt(right, "C1"), formulaAt(right, "C2")]).toEqual([2, 3, "=C1+1"]);
  });

  test("upwards over the edge leaves #REF! in the formula", () => {
    const book = edited(bookAfter(typed("B3", ["=A1"])), [fillCells(area("B3", "B3"), "up", 2)]);
    expect(formulaAt(book, "B2")).toBe("=#REF!");
    expect(valueAt(book, "B1")).toBe("#REF!");
  });
});

describe("copying and cutting", () => {
  test("a copy takes its relative references along, values alone if asked", () => {
    const book = bookAfter(typed("A1", [2, "=A1*10"]));
    const clip = { book, area: area("A1", "B1") };
    expect(formulaAt(edited(book, [pasteCells(clip, at("C3"))]), "D3")).toBe("=C3*10");
    const values = edited(book, [pasteCells(clip, at("C3"), "values")]);
    expect([formulaAt(values, "D3"), valueAt(values, "D3")]).toEqual([undefined, 20]);
  });

  test("a cut is followed by every reference to it, also to another sheet", () => {
    const book = bookAfter(typed("A1", [5, "=A1", "=SUM(A1:B1)"]), addSheet("Second sheet"));
    const moved = edited(book, [moveCells(area("A1", "A1"), at("B2", 1))]);
    expect(formulaAt(moved, "B1")).toBe("='Second sheet'!B2");
    expect(formulaAt(moved, "C1")).toBe("=SUM(A1:B1)");
    expect([valueAt(moved, "B1"), valueAt(moved, "A1")]).toEqual([5, null]);
    const formula = edited(book, [moveCells(area("B1", "B1"), at("A1", 1))]);
    expect(formulaAt(formula, "A1", 1)).toBe("=Sheet1!A1");
  });

  test("part of a result of several cells is not torn out", () => {
    const book = bookAfter(typed("A1", ["={1;2;3}"]));
    expect(() => edited(book, [moveCells(area("A2", "A2"), at("C1"))])).toThrow(/select that formula's cell too/);
    expect(() => edited(book, [sortRows(area("A1", "A3"), [{ column: 0 }])])).toThrow(/filled by one formula/);
    expect(down(edited(book, [moveCells(area("A1", "A3"), at("C1"))]), "C1", 3)).toEqual([1, 2, 3]);
  });
});

describe("sorting", () => {
  test("puts numbers, texts, logicals, errors, blanks in that order and keeps rows together", () => {
    const book = bookAfter(typed("A1", ["b", 1], [null, 2], [3, 3], ["=1/0", 4], [true, 5], ["A", 6], [-1, 7]));
    const sorted = edited(book, [sortRows(area("A1", "B7"), [{ column: 0 }])]);
    expect(down(sorted, "A1", 7)).toEqual([-1, 3, "A", "b", true, "#DIV/0!", null]);
    expect(down(sorted, "B1", 7)).toEqual([7, 3, 6, 1, 5, 4, 2]);
    const back = edited(book, [sortRows(area("A1", "B7"), [{ column: 0, descending: true }])]);
    expect(down(back, "A1", 7)).toEqual(["#DIV/0!", true, "b", "A", 3, -1, null]);
  });

  test("by several columns keeps equal rows in their order, and a formula in its row", () => {
    const book = bookAfter(
      typed("A1", [2, 1, "p"], [1, 2, "q"], [2, 0, "r"], [1, 2, "s"]),
      fillFormula({ sheet: 0, column: 3, from: 0, to: 4 }, "=A1*10+B1"),
    );
    const sorted = edited(book, [sortRows(area("A1", "D4"), [{ column: 0 }, { column: 1, descending: true }])]);
    expect(down(sorted, "C1", 4)).toEqual(["q", "s", "p", "r"]);
    expect(down(sorted, "D1", 4)).toEqual([12, 12, 21, 20]);
    expect(formulaAt(sorted, "D4")).toBe("=A4*10+B4");
  });

  test("uses what formulas give after the edits before it", () => {
    const book = bookAfter(
      typed("A1", [1], [2]),
      fillFormula({ sheet: 0, column: 1, from: 0, to: 2 }, "=-A1"),
      sortRows(area("A1", "B2"), [{ column: 1 }]),
    );
    expect(down(book, "A1", 2)).toEqual([2, 1]);
  });
});

describe("finding, replacing, converting, filtering", () => {
  const book = bookAfter(
    typed("A1", ["Kepler-10"], ["kepler"], ["a.b"], [10], ['="Kep"&A4']),
    typed("B1", ["1e3"], ["12 "], ["x"], [5]),
  );

  test("looks at what cells show or at formulas", () => {
    const found = (search: Parameters<typeof findCells>[2]) =>
      [...findCells(book, area("A1", "A5"), search)].map(({ row }) => row);
    expect(found({ text: "kep" })).toEqual([0, 1, 4]);
    expect(found({ text: "kep", matchCase: true })).toEqual([1]);
    expect(found({ text: "kepler", wholeCell: true })).toEqual([1]);
    expect(found({ text: "." })).toEqual([2]);
    expect(found({ text: "A4", inFormulas: true })).toEqual([4]);
  });

  test("replaces in texts and, if asked, in formulas", () => {
    const texts = edited(book, [replaceText(area("A1", "A5"), { text: "kep" }, "$&K")]);
    expect(down(texts, "A1", 5)).toEqual(["$&Kler-10", "$&Kler", "a.b", 10, "Kep10"]);
    const formulas = edited(book, [replaceText(area("A1", "A5"), { text: "A4", inFormulas: true }, "B4")]);
    expect([formulaAt(formulas, "A5"), valueAt(formulas, "A5")]).toEqual(['="Kep"&B4', "Kep5"]);
  });

  test("text to number leaves what is none", () => {
    expect(down(edited(book, [textToNumber({ sheet: 0, column: 1, from: 0, to: 4 })]), "B1", 4)).toEqual([
      1000,
      12,
      "x",
      5,
    ]);
  });

  test("a filter is a view", () => {
    const rows = filterRows(book, area("A1", "B5"), [{ column: 0, keeps: (cell) => typeof cell === "string" }]);
    expect([...rows]).toEqual([0, 1, 2, 4]);
  });
});

describe("sheets and names", () => {
  test("a renamed sheet takes its references along, a removed one leaves #REF!", () => {
    const real = edited(bookAfter(addSheet("Two"), typed("A1", ["=Two!A1*2"])), [setOn(at("A1", 1), 21)]);
    expect(valueAt(real, "A1")).toBe(42);
    const renamed = edited(real, [renameSheet(1, "It's two")]);
    expect([formulaAt(renamed, "A1"), valueAt(renamed, "A1")]).toEqual(["='It''s two'!A1*2", 42]);
    const removed = edited(real, [removeSheet(1)]);
    expect([formulaAt(removed, "A1"), valueAt(removed, "A1")]).toEqual(["=#REF!*2", "#REF!"]);
    expect(() => edited(removed, [removeSheet(0)])).toThrow(/at least one sheet/);
    expect(() => edited(real, [addSheet("TWO")])).toThrow(/already a sheet/);
    expect(() => edited(real, [addSheet("a/b")])).toThrow(/cannot be used/);
  });

  test("a reference to a sheet that is not there waits for it", () => {
    const book = bookAfter(typed("A1", ["=Later!B2"]));
    expect(messageAt(book, "A1")).toContain('"Later" is no sheet of this book');
    expect(valueAt(edited(book, [addSheet("Later")]), "A1")).toBe(0);
  });

  test("a name means its cells or its constant wherever it stands", () => {
    const book = bookAfter(
      typed("A1", [3, "=star*light"], [4, "=SUM(both)"]),
      defineName("star", "=A1", 0),
      defineName("light", "=10", 0),
      defineName("both", "=A1:A2", 0),
    );
    expect([valueAt(book, "B1"), valueAt(book, "B2")]).toEqual([30, 7]);
    const changed = edited(book, [typed("A1", [5])]);
    expect([valueAt(changed, "B1"), valueAt(changed, "B2")]).toEqual([50, 9]);
    const moved = edited(changed, [insertRows(0, 0, 2)]);
    expect(valueAt(edited(moved, [typed("A3", [6])]), "B3")).toBe(60);
    expect(valueAt(edited(book, [defineName("LIGHT", "=100", 0)]), "B1")).toBe(300);
    const gone = edited(book, [removeName("star")]);
    expect(valueAt(gone, "B1")).toBe("#NAME?");
    expect(messageAt(gone, "B1")).toContain("star: nothing has this name");
    expect([valueAt(edited(book, [deleteRows(0, 0, 1)]), "B1")]).toEqual([4]);
    expect(() => edited(book, [defineName("B2", "=A1", 0)])).toThrow(/do not read as a cell/);
    expect(() => edited(book, [defineName("x", "=SUM(", 0)])).toThrow(/never closed/);
  });
});

describe("clearing", () => {
  test("whole columns is quick and leaves nothing", () => {
    const book = edited(bookAfter(typed("A1", [1, "=A1"])), [clearCells(area("A1", "B1048576"))]);
    expect([valueAt(book, "A1"), valueAt(book, "B1"), formulaAt(book, "B1")]).toEqual([null, null, undefined]);
  });
});

function setOn(place: ReturnType<typeof at>, value: number) {
  return setCells(place, [[value]]);
}
