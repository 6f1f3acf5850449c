import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { columnAxis } from "../../../../src/hosts/bench/page/grid/layout/columnAxis.js";
import { rowAxis } from "../../../../src/hosts/bench/page/grid/layout/rowAxis.js";
import { reachOf } from "../../../../src/hosts/bench/page/grid/press/fillPress.js";
import { columnsBetween, rowsBetween } from "../../../../src/hosts/bench/page/grid/select/areas.js";
import { areaText } from "../../../../src/hosts/bench/page/grid/select/areaText.js";
import { walk } from "../../../../src/hosts/bench/page/grid/select/walk.js";

const widths = fc.array(fc.constantFrom<number>(0, 24, 92, 200), { minLength: 1, maxLength: 40 });

describe("columns along their axis", () => {
  test("a column starts where those before it end", () => {
    const axis = columnAxis([100, 0, 50, 80], 1);
    expect([0, 1, 2, 3].map(axis.startOf)).toEqual([0, 100, 100, 150]);
    expect([axis.frozenWidth, axis.width]).toEqual([100, 230]);
    expect([0, 99, 100, 149, 150, 229, 900].map(axis.at)).toEqual([0, 0, 2, 2, 3, 3, 3]);
    expect([axis.step(0, 1), axis.step(2, -1), axis.step(3, 5), axis.step(0, -1), axis.step(0, 2)]).toEqual([
      2, 0, 3, 0, 3,
    ]);
  });

  test("a point lies in the column that is found for it, which is never a hidden one", () => {
    fc.assert(
      fc.property(widths, fc.double({ min: 0, max: 0.999999, noNaN: true }), (widths, part) => {
        fc.pre(widths.some((width) => width > 0));
        const axis = columnAxis(widths, 0);
        const distance = part * axis.width;
        const column = axis.at(distance);
        const before = widths.slice(0, column).reduce((sum, width) => sum + width, 0);
        expect(distance).toBeGreaterThanOrEqual(before);
        expect(distance).toBeLessThan(before + widths[column]!);
      }),
    );
  });
});

test("a filter's rows: their own numbers, then the spare ones of the sheet", () => {
  const kept = [0, 3, 4, 9];
  const axis = rowAxis(
    { sheetRow: (row) => kept[row]!, viewRow: (row) => kept.filter((each) => each < row).length },
    { rows: 12, visibleRows: 4 },
    20,
  );
  expect([0, 1, 2, 3, 4, 5].map(axis.toSheet)).toEqual([0, 3, 4, 9, 12, 13]);
  expect([0, 3, 5, 9, 10, 12, 13].map(axis.toView)).toEqual([0, 1, 3, 3, 4, 4, 5]);
  expect([3, 8, 9, 11, 12].map(axis.lastInView)).toEqual([1, 2, 3, 3, 4]);
});

describe("walking through an area", () => {
  const rows = { toView: (row: number) => row, lastInView: (row: number) => row, count: 100 };
  const area = { sheet: 0, top: 2, left: 1, bottom: 4, right: 3 };
  const walkAll = (down: boolean, backwards: boolean, columns: Parameters<typeof walk>[3]) => {
    const seen: string[] = [];
    let spot = { row: 2, column: 1 };
    do {
      spot = walk(area, spot, { down, backwards }, columns, rows);
      seen.push(`${spot.row}:${spot.column}`);
    } while (seen.length < 20 && !(spot.row === 2 && spot.column === 1));
    return seen;
  };
  test.each([
    [false, false, "2:2 2:3 3:1 3:2 3:3 4:1 4:2 4:3 2:1"],
    [true, false, "3:1 4:1 2:2 3:2 4:2 2:3 3:3 4:3 2:1"],
    [false, true, "4:3 4:2 4:1 3:3 3:2 3:1 2:3 2:2 2:1"],
  ])("down %s, backwards %s", (down, backwards, expected) => {
    expect(walkAll(down, backwards, columnAxis([9, 9, 9, 9], 0)).join(" ")).toBe(expected);
  });
  test("hidden columns are passed over", () => {
    expect(walkAll(false, false, columnAxis([9, 9, 0, 9], 0)).join(" ")).toBe("2:3 3:1 3:3 4:1 4:3 2:1");
  });
});

describe("areas in words", () => {
  test.each([
    [{ sheet: 0, top: 3, left: 1, bottom: 3, right: 1 }, "B4"],
    [{ sheet: 0, top: 3, left: 1, bottom: 8, right: 27 }, "B4:AB9"],
    [columnsBetween(0, 3, 1), "B:D"],
    [rowsBetween(0, 8, 1), "2:9"],
  ])("%s", (area, text) => {
    expect(areaText(area)).toBe(text);
  });
});

describe("where a dragged fill reaches", () => {
  const area = { sheet: 0, top: 4, left: 4, bottom: 5, right: 6 };
  test.each([
    [{ row: 9, column: 5 }, "down", 4],
    [{ row: 1, column: 7 }, "up", 3],
    [{ row: 6, column: 9 }, "right", 3],
    [{ row: 5, column: 0 }, "left", 4],
  ])("%s", (place, toward, count) => {
    expect(reachOf(area, place)).toMatchObject({ toward, count });
  });
  test("inside nowhere", () => {
    expect(reachOf(area, { row: 5, column: 6 })).toBeUndefined();
  });
});
