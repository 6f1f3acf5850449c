import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Cell, CellError, type ErrorCode } from "../../../src/call/cell.js";
import { blockOf, cellsOf } from "../../../src/call/column.js";
import { argumentOfHost, hostOfResult } from "../../../src/hosts/office/boundary.js";
import { HostError, misshown, standInHost } from "./standInHost.js";

standInHost();

function cellsIn(value: unknown): Cell[][] | undefined {
  const argument = argumentOfHost(value, "period", "REFLEX");
  if (argument instanceof CellError) throw new Error(argument.message);
  return argument && cellsOf(argument.block);
}

function refusal(value: unknown): string {
  const argument = argumentOfHost(value, "period", "REFLEX");
  return argument instanceof CellError ? argument.message : "taken";
}

function errorIn(value: unknown): [ErrorCode, string] {
  const cell = cellsIn([[value]])![0]![0]!;
  if (!(cell instanceof CellError)) throw new Error(`read as ${cell}`);
  return [cell.code, cell.message];
}

function thrownBy(run: () => unknown): HostError {
  try {
    run();
  } catch (error) {
    return error as HostError;
  }
  throw new Error("nothing was thrown");
}

describe("what the host hands over", () => {
  test("is nothing where an argument was left out", () => {
    expect(cellsIn(null)).toBeUndefined();
    expect(cellsIn(undefined)).toBeUndefined();
  });

  test.each([
    [4.23, 4.23],
    [0, 0],
    ["4.23 d", "4.23 d"],
    [true, true],
    ["", null],
  ])("may be a bare value: %j", (value, cell) => {
    expect(cellsIn(value)).toEqual([[cell]]);
  });

  test.each([
    ["a blank on the web", null, null],
    ["a blank without a value", undefined, null],
    ["an empty text", "", null],
    ["a blank of the data types", { type: "Empty" }, null],
    ["a blank in a range on the desktop", 0, 0],
    ["a formatted number", { type: "FormattedNumber", basicValue: 4.23, numberFormat: "0.0" }, 4.23],
    ["a rich text", { type: "String", basicValue: "4.23 d" }, "4.23 d"],
    ["a rich logical value", { type: "Boolean", basicValue: false }, false],
    ["an entity with a number", { type: "Entity", text: "b", basicType: "Double", basicValue: 2 }, 2],
    ["an entity without one", { type: "Entity", text: "HD 1", basicType: "Error", basicValue: "#VALUE!" }, "HD 1"],
  ])("is unwrapped: %s", (_, value, cell) => {
    expect(cellsIn([[value]])).toEqual([[cell]]);
  });

  test("keeps the shape of a range", () => {
    expect(
      cellsIn([
        [1, 0.1],
        ["x", null],
      ]),
    ).toEqual([
      [1, 0.1],
      ["x", null],
    ]);
  });

  // The seven codes of ISO/IEC 26300-3 that a custom function can give back.
  test.each(["#VALUE!", "#N/A", "#DIV/0!", "#REF!", "#NAME?", "#NUM!", "#NULL!"] as const)(
    "may be an error, which stays %s",
    (code) => {
      expect(errorIn(new HostError(code))[0]).toBe(code);
      expect(errorIn({ type: "Error", basicType: "Error", basicValue: code })[0]).toBe(code);
      expect(errorIn({ type: "CustomFunctionError", code })[0]).toBe(code);
    },
  );

  test("keeps the sentence of an error that has one", () => {
    expect(errorIn(new HostError("#N/A", "REFLEX: period is blank"))[1]).toBe("REFLEX: period is blank");
  });

  test.each([
    ["an error of newer hosts", { type: "Error", basicValue: "#SPILL!" }, "#SPILL!"],
    ["a picture", { type: "WebImage", basicType: "Error", basicValue: "#VALUE!" }, "WebImage"],
    ["a table in a cell", { type: "Array", elements: [[1]] }, "Array"],
    ["no number", Number.NaN, "NaN"],
  ])("is an error in words where nothing can read it: %s", (_, value, named) => {
    const [code, message] = errorIn(value);
    expect(code).toBe("#VALUE!");
    expect(message).toContain(named);
  });

  test("is refused where it is a whole column, with advice", () => {
    const column = (rows: number) => new Array(rows).fill([0]);
    expect(refusal(column(100_000))).toBe("taken");
    // 1,048,576 rows: the worksheet of ISO/IEC 29500 hosts (common practice).
    expect(refusal(column(1_048_576))).toBe(
      "REFLEX: period is 1048576 rows, a whole column of the worksheet; give the rows of the table alone, at most 100000, for example B2:B500.",
    );
    expect(refusal(column(100_001))).toContain("100001 rows, more than one call takes;");
    expect(refusal(new Array(50_000).fill(new Array(7).fill(0)))).toContain("50000 x 7 cells");
  });
});

describe("what goes back", () => {
  const bare = (numbers: number[]) => ({
    rows: numbers.length,
    columns: [{ length: numbers.length, numbers: Float64Array.from(numbers), others: undefined }],
  });

  test("is numbers, texts, and an empty text for a blank", () => {
    expect(hostOfResult(blockOf([[1.5, "km/s", null, true]]), "X")).toEqual([[1.5, "km/s", "", true]]);
  });

  test.each([Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY])("is never %s", (number) => {
    const error = thrownBy(() => hostOfResult(bare([number]), "REFLEX"));
    expect(error).toBeInstanceOf(HostError);
    expect([error.code, error.message]).toEqual([
      "#VALUE!",
      `REFLEX: it gave ${number}, a mistake of Barycell and not of your table; report it with this formula and its inputs.`,
    ]);
    const [[first], [second]] = hostOfResult(bare([1, number]), "REFLEX") as [[number], [HostError]];
    expect(first).toBe(1);
    expect(second).toBeInstanceOf(HostError);
    expect(second.code).toBe("#VALUE!");
  });

  test.each(["#VALUE!", "#N/A"] as const)("is a thrown error with its sentence for one cell: %s", (code) => {
    const error = thrownBy(() => hostOfResult(blockOf([[new CellError(code, "t", "X: why")]]), "X"));
    expect([error.code, error.message]).toEqual([code, "X: why"]);
  });

  test.each(["#DIV/0!", "#NUM!", "#NULL!"] as const)("is thrown without a sentence for %s", (code) => {
    const error = thrownBy(() => hostOfResult(blockOf([[new CellError(code, "t", "X: why")]]), "X"));
    expect([error.code, error.message]).toEqual([code, ""]);
  });

  // The runtime script makes #VALUE! of these two when they are thrown.
  test.each(["#REF!", "#NAME?"] as const)("stays in its cell for %s", (code) => {
    const [[error]] = hostOfResult(blockOf([[new CellError(code, "t", "X: why")]]), "X") as [[HostError]];
    expect(error.code).toBe(code);
  });

  test("keeps a long column of errors small", () => {
    const errors = Array.from({ length: 100_000 }, (_, row) => [
      new CellError("#N/A", "t", `X: ${row} ${"w".repeat(200)}`),
    ]);
    const rows = hostOfResult(blockOf(errors), "X") as HostError[][];
    expect(rows[0]![0]!.message).toContain("X: 0 ");
    expect(rows.every(([error]) => error!.code === "#N/A")).toBe(true);
    expect(rows.reduce((sum, [error]) => sum + error!.message.length, 0)).toBeLessThan(1_000_000);
  });

  test("is nothing a host shows wrongly, whatever the cells", () => {
    const cell = fc.oneof(
      fc.double(),
      fc.string(),
      fc.boolean(),
      fc.constant(null),
      fc.constantFrom<ErrorCode>("#VALUE!", "#REF!").map((code) => new CellError(code, "t", "why")),
    );
    fc.assert(
      fc.property(fc.array(fc.tuple(cell, cell), { minLength: 1, maxLength: 5 }), (cells) => {
        expect(misshown(hostOfResult(blockOf(cells), "X"))).toEqual([]);
      }),
    );
  });

  test("is found out where it is not", () => {
    expect(misshown([[1, Number.NaN]])).toEqual(["row 0 holds NaN"]);
    expect(misshown([[null], [undefined]])).toEqual(["row 0 holds null", "row 1 holds undefined"]);
    expect(misshown([[1], [2, 3]])).toEqual(["row 1 is ragged"]);
    expect(misshown(5)).toEqual(["not a matrix"]);
  });
});
