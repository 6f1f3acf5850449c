import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Cell, CellError } from "../../src/call/cell.js";
import { columnOf } from "../../src/call/column.js";
import { type ComparedTable, compareTables } from "../../src/table/compareTables.js";

interface Written {
  readonly keys?: readonly string[];
  readonly columns: Readonly<Record<string, readonly Cell[]>>;
  readonly sigmas?: Readonly<Record<string, readonly Cell[]>>;
}

function table({ columns, keys, sigmas }: Written): ComparedTable {
  const rows = Object.values(columns)[0]?.length ?? 0;
  return {
    keys: keys ?? Array.from({ length: rows }, (_, row) => `row ${row}`),
    columns: Object.entries(columns).map(([header, cells]) => {
      const sigma = sigmas?.[header];
      return { header, column: columnOf(cells), ...(sigma ? { sigma: columnOf(sigma) } : {}) };
    }),
  };
}

describe("what moved between two states of a table", () => {
  test("nothing, where nothing did", () => {
    const state = table({ columns: { "K [m/s]": [1, "text", null, true] } });
    expect(compareTables(state, state)).toEqual({ movements: [], onlyBefore: [], onlyAfter: [] });
  });

  test("by how much, as a part of the value, and in sigmas", () => {
    const before = table({ columns: { "K [m/s]": [40] }, sigmas: { "K [m/s]": [4] } });
    const after = table({ columns: { "K [m/s]": [50] }, sigmas: { "K [m/s]": [5] } });
    // By hand: 10, a quarter of 40, 2.5 times 4.
    expect(compareTables(before, after).movements).toEqual([
      expect.objectContaining({ before: 40, after: 50, change: 10, relative: 0.25, sigmas: 2.5 }),
    ]);
  });

  test("from zero there is no relative change; without uncertainty no sigmas", () => {
    const { movements } = compareTables(table({ columns: { x: [0] } }), table({ columns: { x: [2] } }));
    expect(movements).toEqual([expect.objectContaining({ change: 2, relative: undefined, sigmas: undefined })]);
  });

  test("the uncertainty after counts where there was none before", () => {
    const after = table({ columns: { x: [2] }, sigmas: { x: [0.5] } });
    expect(compareTables(table({ columns: { x: [1] } }), after).movements[0]!.sigmas).toBe(2);
  });

  test("errors and blanks first, then by sigmas, then by relative size", () => {
    const error = new CellError("#N/A", "elsewhere", "not yet");
    const before = table({
      keys: ["small", "large", "broken", "gone", "still"],
      columns: { "K [m/s]": [10, 10, 10, 10, 10], z: [1, 1, 1, 1, 1] },
      sigmas: { "K [m/s]": [1, 1, 1, 1, 1] },
    });
    const after = table({
      keys: ["small", "large", "broken", "gone", "still"],
      columns: { "K [m/s]": [11, 15, error, null, 10], z: [1, 1.5, 1, 1, 3] },
      sigmas: { "K [m/s]": [1, 1, 1, 1, 1] },
    });
    expect(compareTables(before, after).movements.map(({ key, header }) => `${key} ${header}`)).toEqual([
      "broken K [m/s]",
      "gone K [m/s]",
      "large K [m/s]",
      "small K [m/s]",
      "still z",
      "large z",
    ]);
  });

  test("rows are followed by their names through sorting, adding and taking away", () => {
    const before = table({ keys: ["a", "b", "c"], columns: { x: [1, 2, 3] } });
    const after = table({ keys: ["c", "d", "a"], columns: { x: [3, 4, 9] } });
    expect(
      compareTables(before, after).movements.map(({ key, before, after, rowBefore, rowAfter }) => [
        key,
        before,
        after,
        rowBefore,
        rowAfter,
      ]),
    ).toEqual([
      ["b", 2, null, 1, undefined],
      ["d", null, 4, undefined, 1],
      ["a", 1, 9, 0, 2],
    ]);
  });

  test("a unit changed in the header is no movement", () => {
    const before = table({ columns: { "Mass [jupiterMass]": [1] }, sigmas: { "Mass [jupiterMass]": [0.1] } });
    // 1 jupiterMass is 317.82840659 earthMass: ratio of the nominal mass parameters of IAU 2015 B3.
    const after = table({ columns: { "Mass [earthMass]": [317.82840659] }, sigmas: { "Mass [earthMass]": [31.78] } });
    const { movements, onlyBefore, onlyAfter } = compareTables(before, after);
    expect([onlyBefore, onlyAfter]).toEqual([[], []]);
    for (const { relative } of movements) expect(Math.abs(relative!)).toBeLessThan(1e-10);
  });

  test("columns that are there once only are named", () => {
    const before = table({ columns: { "K [m/s]": [1], old: [1] } });
    const after = table({ columns: { "K [km/s]": [0.002], new: [1] } });
    const { movements, onlyBefore, onlyAfter } = compareTables(before, after);
    expect(movements).toEqual([expect.objectContaining({ header: "K [m/s]", before: 1, after: 2, change: 1 })]);
    expect([onlyBefore, onlyAfter]).toEqual([["old"], ["new"]]);
  });

  test("there and back differ in sign only", () => {
    const numbers = fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { minLength: 3, maxLength: 3 });
    fc.assert(
      fc.property(numbers, numbers, (first, second) => {
        const [a, b] = [table({ columns: { x: first } }), table({ columns: { x: second } })];
        const there = compareTables(a, b).movements.map(({ key, change }) => `${key} ${change}`);
        const back = compareTables(b, a).movements.map(({ key, change }) => `${key} ${change === 0 ? 0 : -change!}`);
        expect(back.sort()).toEqual(there.sort());
      }),
    );
  });
});
