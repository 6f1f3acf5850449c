import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";
import type { Operand } from "../../../src/sheet/values/operand.js";
import { isMatrix, matrixOfRows } from "../../../src/sheet/values/operand.js";
import {
  findWorksheetFunction,
  worksheetFunctionNames,
} from "../../../src/sheet/worksheetFunctions/findWorksheetFunction.js";
import type { WorksheetFunction } from "../../../src/sheet/worksheetFunctions/worksheetFunction.js";

/** Values at which functions tend to break. */
const cell: fc.Arbitrary<Cell> = fc.constantFrom<Cell>(
  -3,
  -1,
  -0,
  0,
  0.25,
  0.5,
  1,
  2,
  3,
  7,
  60,
  45413,
  1e-300,
  1e9,
  1e308,
  -1e308,
  "",
  "x",
  "3",
  "-1e-3",
  "2024-05-01",
  "12:30",
  "FF",
  "0000011",
  "a*",
  ">1",
  "i",
  "3+4i",
  "kg",
  "y",
  true,
  false,
  null,
  new CellError("#N/A", "given", "given"),
);

const matrix = fc
  .tuple(fc.integer({ min: 1, max: 3 }), fc.integer({ min: 1, max: 3 }), fc.boolean())
  .chain(([rows, columns, reference]) =>
    fc
      .array(fc.array(cell, { minLength: columns, maxLength: columns }), { minLength: rows, maxLength: rows })
      .map((cells) => ({ ...matrixOfRows(cells), reference })),
  );

const operand: fc.Arbitrary<Operand | undefined> = fc.oneof(
  { weight: 5, arbitrary: cell },
  { weight: 3, arbitrary: matrix },
  { weight: 1, arbitrary: fc.constant(undefined) },
);

function argumentsOf({ leastArguments, mostArguments }: WorksheetFunction): fc.Arbitrary<(Operand | undefined)[]> {
  const most = Math.min(mostArguments, leastArguments + 3);
  return fc.array(operand, { minLength: leastArguments, maxLength: most });
}

/** All cells of a result; of a very large one, cells spread over it. */
function cellsOf(result: Operand): Cell[] {
  if (!isMatrix(result)) return [result];
  const count = result.rows * result.columns;
  const step = Math.max(1, Math.floor(count / 1999));
  return Array.from({ length: Math.ceil(count / step) }, (_, index) => {
    const at = index * step;
    return result.at(Math.floor(at / result.columns), at % result.columns);
  });
}

function expectCell(value: Cell): void {
  if (typeof value === "number") {
    expect(Number.isFinite(value)).toBe(true);
  } else if (value instanceof CellError) {
    expect(value.message.length).toBeLessThanOrEqual(250);
    expect(value.message).not.toMatch(/invalid|please|NaN|undefined|Infinity/);
    expect(["#VALUE!", "#N/A", "#DIV/0!", "#REF!", "#NAME?", "#NUM!", "#NULL!"]).toContain(value.code);
  } else {
    expect(value === null || typeof value === "string" || typeof value === "boolean").toBe(true);
  }
}

describe("every worksheet function, for any arguments, gives cells and never throws", () => {
  it.each(worksheetFunctionNames)("%s", (name) => {
    const called = findWorksheetFunction(name) as WorksheetFunction;
    fc.assert(
      fc.property(argumentsOf(called), (given) => {
        const result = called.call(given);
        for (const value of cellsOf(result)) {
          expectCell(value);
        }
      }),
      { numRuns: 60 },
    );
  });
});

it("refuses a wrong number of arguments", () => {
  for (const name of worksheetFunctionNames) {
    const called = findWorksheetFunction(name) as WorksheetFunction;
    const counts = [called.leastArguments - 1, called.mostArguments + 1].filter((count) => count >= 0 && count < 300);
    for (const count of counts) {
      expect(called.call(new Array(count).fill(1)), name).toMatchObject({ code: "#VALUE!" });
    }
  }
});

it("finds functions in either case", () => {
  expect(findWorksheetFunction("stdev.s")?.name).toBe("STDEV.S");
  expect(findWorksheetFunction("NOSUCH")).toBeUndefined();
});

it.each<[string, readonly Operand[]]>([
  ["BINOM.INV", [1e308, 0.5, 0.5]],
  ["CRITBINOM", [1e308, 0.25, 0.5]],
  ["DB", [1e9, 1, 1e308, 1e308]],
  ["DDB", [1e9, 1, 1e308, 1e308]],
  ["CUMIPMT", [0.1, 1e308, 1e9, 1, 1e308, 0]],
])("%s ends for numbers too large to count to", (name, given) => {
  expect((findWorksheetFunction(name) as WorksheetFunction).call(given)).toMatchObject({ code: "#NUM!" });
});

it("LOOKUP has no answer where the results are fewer than the place found", () => {
  const searched = matrixOfRows([[1], [2], [3]]);
  const results = matrixOfRows([["a"], ["b"]]);
  const lookup = findWorksheetFunction("LOOKUP") as WorksheetFunction;
  expect(lookup.call([2, searched, results])).toBe("b");
  expect(lookup.call([3, searched, results])).toMatchObject({ code: "#N/A" });
});
