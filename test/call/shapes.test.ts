import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Cell, CellError } from "../../src/call/cell.js";
import type { Argument, RowArgument } from "../../src/call/cellFunction.js";
import { cellsOf, columnOf } from "../../src/call/column.js";
import { argumentOf, call, cellOf, column, errorFrom, functionNamed, type Given, numberFrom } from "./door.js";
import { bits, cellLike, logarithmic, widened } from "./table.js";

const headers = "d; solMass; jupiterMass";

describe("shapes", () => {
  test("scalars give a scalar", () => {
    expect(call("AXIS", "4.23 d", "1.1 solMass")).toHaveLength(1);
    expect(call("AXIS", "4.23 d", "1.1 solMass")[0]).toHaveLength(1);
  });

  test("a column gives a column, and a scalar beside it serves every row", () => {
    const cells = call("AXIS", column([1, 8, 27]), 1, undefined, "d; solMass");
    expect(cells.map((row) => row.length)).toEqual([1, 1, 1]);
    const [[first], [second], [third]] = cells as [[number], [number], [number]];
    // Kepler's third law: a ~ P^(2/3).
    expect(second / first).toBeCloseTo(4, 12);
    expect(third / first).toBeCloseTo(9, 12);
  });

  test("two columns of different lengths are told apart by their rows", () => {
    const { code, message } = errorFrom("AXIS", column([1, 8, 27]), column([1, 2]), undefined, "d; solMass");
    expect(code).toBe("#VALUE!");
    expect(message).toContain("star mass has 2 rows and period has 3");
  });

  test("an empty block has no rows", () => {
    const none: Argument = { block: { rows: 0, columns: [columnOf([])] } };
    expect(functionNamed("SHIFT").once([none, undefined, argumentOf("m/s")]).rows).toBe(0);
  });

  test("an uncertainty beside one input makes the result n x 2, two make it n x 3", () => {
    expect(call("AXIS", [[4.23, 0.01]], 1.1, undefined, "d; solMass")[0]).toHaveLength(2);
    expect(call("AXIS", [[4.23, 0.02, 0.01]], 1.1, undefined, "d; solMass")[0]).toHaveLength(3);
    expect(call("AXIS", [[4.23, 0.01]], [[1.1, 0.1, 0.2]], undefined, "d; solMass")[0]).toHaveLength(3);
    expect(call("AXIS", "4.23(1) d", "1.1 +0.1 -0.2 solMass")[0]).toHaveLength(3);
  });

  test("rows that state no uncertainty leave its cell blank", () => {
    const cells = call("AXIS", column(["4.23(1) d", "4.23 d"]), "1.1 solMass");
    expect(typeof cells[0]![1]).toBe("number");
    expect(cells[1]![1]).toBeNull();
  });

  test("columns longer than a block of rows are read to their end", () => {
    const rows = 2500;
    const periods = Array.from({ length: rows }, (_, row) => 1 + row);
    const cells = call("AXIS", column(periods), 1, undefined, "d; solMass").flat() as number[];
    for (const row of [0, 1023, 1024, 2047, 2048, rows - 1]) {
      expect(cells[row]).toBe(numberFrom("AXIS", periods[row]!, 1, undefined, "d; solMass"));
    }
  });
});

/** A call over some rows: each argument a column of its own (with uncertainties or not), or the same in every row. */
interface Table {
  readonly name: string;
  readonly rows: number;
  readonly columns: readonly (readonly (readonly Cell[])[] | undefined)[];
  readonly fixed: readonly boolean[];
  readonly tail: readonly Given[];
}

const good = {
  d: fc.oneof(logarithmic(0.1, 1e4), fc.constantFrom<Cell>("4.23 d", "1.5(2) yr", "100 +3 -2 d")),
  solMass: fc.oneof(logarithmic(0.05, 50), fc.constantFrom<Cell>("1.1 ± 0.05 solMass", "1000 jupiterMass")),
  jupiterMass: fc.oneof(logarithmic(1e-3, 50), fc.constantFrom<Cell>("3 earthMass", "0.47 +0.02 -0.03 Mjup")),
  ratio: fc.oneof(fc.double({ min: 0, max: 0.99, noNaN: true }), fc.constantFrom<Cell>("0.01(1)", "5 %", null)),
  deg: fc.oneof(fc.double({ min: 1, max: 179, noNaN: true }), fc.constantFrom<Cell>("86.7 ± 0.1 deg", "1.5 rad")),
  "m/s": fc.oneof(logarithmic(0.01, 1e4), fc.constantFrom<Cell>("1 km/s", "55.9 ± 0.7 m/s")),
  model: fc.constantFrom<Cell>("linear", "relativistic", null, "LINEAR"),
} as const;

type Slot = keyof typeof good;
const forms: readonly { name: string; slots: readonly Slot[]; headers: string; result?: string }[] = [
  { name: "REFLEX", slots: ["d", "solMass", "jupiterMass", "ratio", "deg"], headers: "d;solMass;jupiterMass;1;deg" },
  { name: "PLANETMASS", slots: ["m/s", "d", "solMass", "deg", "ratio"], headers: "m/s;d;solMass;deg;1" },
  { name: "AXIS", slots: ["d", "solMass", "jupiterMass"], headers, result: "solRad" },
  { name: "SHIFT", slots: ["m/s", "model"], headers: "m/s" },
  { name: "INTO", slots: ["d"], headers: "d", result: "h" },
  { name: "INTO", slots: ["m/s"], headers: "m/s", result: "log(cm/s)" },
  { name: "TAG", slots: ["jupiterMass"], headers: "jupiterMass" },
];

const table: fc.Arbitrary<Table> = fc
  .tuple(fc.constantFrom(...forms), fc.integer({ min: 1, max: 7 }))
  .chain(([form, rows]) =>
    fc
      .tuple(
        ...form.slots.map((slot) =>
          fc.tuple(fc.integer({ min: slot === "model" ? 1 : 0, max: 3 }), fc.boolean()).chain(([width, fixed]) => {
            const columns = slot === "model" ? 1 : Math.max(1, width);
            const sigma = fc.oneof({ weight: 4, arbitrary: logarithmic(1e-4, 0.1) }, cellLike(fc.constant(0.01)));
            const row = fc.tuple(
              cellLike(good[slot]),
              ...Array.from({ length: columns - 1 }, () => sigma as fc.Arbitrary<Cell>),
            );
            const count = fixed ? 1 : rows;
            return fc.record({
              cells: fc.array(row, { minLength: count, maxLength: count }),
              fixed: fc.constant(fixed),
            });
          }),
        ),
      )
      .map((slots) => ({
        name: form.name,
        rows,
        columns: slots.map(({ cells }) => cells),
        fixed: slots.map(({ fixed }) => fixed),
        tail: [form.headers, form.result],
      })),
  );

const rowOf = ({ columns, fixed, tail }: Table, row: number): Given[] => [
  ...columns.map((cells, index) => cells && [cells[fixed[index] ? 0 : row]!]),
  ...tail,
];
const rowByRow = (given: Table) =>
  Array.from({ length: given.rows }, (_, row) => call(given.name, ...rowOf(given, row))[0]!);

function filledDown({ name, rows, columns, fixed, tail }: Table): Cell[][] {
  const inputs = columns.map((cells, index): RowArgument => {
    if (!cells) return { fixed: undefined };
    if (fixed[index]) return { fixed: argumentOf(cells) };
    return { perRow: cells[0]!.map((_, part) => columnOf(cells.map((row) => row[part]!))) };
  });
  return cellsOf(functionNamed(name).eachRow(rows, [...inputs, ...tail.map((one) => ({ fixed: argumentOf(one) }))]));
}

const asOneCall = ({ name, columns, tail }: Table) => call(name, ...columns, ...tail);

describe("one call with columns, one call a row, one formula filled down", () => {
  test("filled down is one call a row, to the last bit", () => {
    fc.assert(
      fc.property(table, (given) => {
        expect(widened(filledDown(given))).toEqual(widened(rowByRow(given)));
      }),
      { numRuns: 250 },
    );
  });

  test("a call with columns gives each row's numbers to the last bit", () => {
    fc.assert(
      fc.property(table, (given) => {
        fc.pre(!given.fixed.every(Boolean));
        const rows = rowByRow(given);
        const cells = asOneCall(given);
        expect(cells).toHaveLength(given.rows);
        cells.forEach((cell, row) => {
          const [value, upper, lower] = rows[row]!;
          expect(bits(cell[0])).toBe(bits(value));
          expect(bits(cell[1])).toBe(bits(upper));
          // In a result of three columns a row whose uncertainty is symmetric states it twice.
          expect(bits(cell[2])).toBe(bits(cell.length === 3 ? (lower ?? upper) : undefined));
        });
      }),
      { numRuns: 250 },
    );
  });

  test("headers and result header may differ from row to row", () => {
    const rows = 3;
    const cells = cellsOf(
      functionNamed("AXIS").eachRow(rows, [
        { perRow: [columnOf([1, 24, 1440])] },
        { fixed: argumentOf("1 solMass") },
        { fixed: undefined },
        { perRow: [columnOf(["d", "h", "min"]), columnOf(["", "", ""])] },
        { fixed: argumentOf("km") },
      ]),
    ).flat() as number[];
    // One day each time, 24 h, 1440 min.
    expect(cells[1]! / cells[0]!).toBeCloseTo(1, 14);
    expect(cells[2]! / cells[0]!).toBeCloseTo(1, 14);
  });

  test("the same cells in every row give the same answer in every row", () => {
    const arguments_ = ["4.23(1) d", "1.1 solMass"].map((cell) => ({ fixed: argumentOf(cell) }));
    const cells = cellsOf(functionNamed("AXIS").eachRow(4, arguments_));
    expect(cells).toHaveLength(4);
    expect(widened(cells)).toEqual(widened(Array(4).fill(call("AXIS", "4.23(1) d", "1.1 solMass")[0])));
    expect(cellsOf(functionNamed("UNITOF").eachRow(2, [{ fixed: argumentOf("K [m s-1]") }]))).toEqual([
      ["m/s"],
      ["m/s"],
    ]);
  });

  test("sorting the rows sorts the results", () => {
    fc.assert(
      fc.property(
        table.chain((given) =>
          fc.tuple(
            fc.constant(given),
            fc.shuffledSubarray([...Array(given.rows).keys()], { minLength: given.rows, maxLength: given.rows }),
          ),
        ),
        ([given, order]) => {
          fc.pre(!given.fixed.every(Boolean));
          const columns = given.columns.map((cells, index) =>
            given.fixed[index] ? cells : order.map((row) => cells![row]!),
          );
          const sorted = widened(asOneCall({ ...given, columns }));
          const before = widened(asOneCall(given));
          expect(sorted).toEqual(order.map((row) => before[row]));
        },
      ),
      { numRuns: 200 },
    );
  });

  test("a bad row spoils itself alone", () => {
    const good = [4.23, 3.52, 5.37];
    const whole = call("AXIS", column(good), 1.1, undefined, "d; solMass");
    for (const bad of [null, "n/a", 0, -1, "5 mag", new CellError("#DIV/0!", "elsewhere", "by zero")] as Cell[]) {
      const cells = call("AXIS", column([4.23, bad, 5.37]), 1.1, undefined, "d; solMass");
      expect(cells[0]).toEqual(whole[0]);
      expect(cells[1]![0]).toBeInstanceOf(CellError);
      expect(cells[2]).toEqual(whole[2]);
    }
    expect(cellOf("AXIS", 0, 1.1, undefined, "d; solMass")).toBeInstanceOf(CellError);
  });
});
