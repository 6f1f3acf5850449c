import { describe, expect, test } from "vitest";
import { cellAt } from "../../src/call/column.js";
import { tableOf } from "../../src/table/tableOf.js";

describe("where a table lies in a rectangle of cells", () => {
  test("headers in the first row", () => {
    const plan = tableOf([
      ["Target", "Period [d]", null],
      ["a", 3, null],
      ["b", 4, null],
    ])!;
    expect(plan).toMatchObject({ headerRow: 0, unitRow: undefined, firstRow: 1, rows: 2 });
    expect(plan.columns.map(({ header, index }) => [header, index])).toEqual([
      ["Target", 0],
      ["Period [d]", 1],
    ]);
    expect(cellAt(plan.columns[1]!.column, 1)).toBe(4);
  });

  test("a title above and blank rows below do not count", () => {
    const plan = tableOf([
      ["Winter targets", null, null],
      [null, null, null],
      ["Target", "P", "K"],
      ["a", 3, 5],
      [null, null, null],
      ["b", 4, 6],
      [null, "", null],
    ])!;
    expect(plan).toMatchObject({ headerRow: 2, firstRow: 3, rows: 3 });
  });

  test("a row of units follows the headers", () => {
    const plan = tableOf([
      ["Target", "P", "M*", "e"],
      ["-", "d", "M_sun", "-"],
      ["a", 3, 1, 0.1],
    ])!;
    expect(plan).toMatchObject({ headerRow: 0, unitRow: 1, firstRow: 2, rows: 1 });
    expect(plan.columns.map(({ unitCell }) => unitCell)).toEqual([undefined, "d", "M_sun", undefined]);
  });

  test("a first row of texts is data, not units", () => {
    expect(
      tableOf([
        ["Target", "Note"],
        ["Lantern 1", "faint"],
      ]),
    ).toMatchObject({ unitRow: undefined, rows: 1 });
  });

  test.each([
    ["nothing", [[null, null]]],
    [
      "numbers alone",
      [
        [1, 2],
        [3, 4],
      ],
    ],
    [
      "quantities alone",
      [
        ["4.23 d", "1.1 solMass"],
        ["5 d", "1 solMass"],
      ],
    ],
  ])("%s: no table", (_, cells) => {
    expect(tableOf(cells)).toBeUndefined();
  });
});
