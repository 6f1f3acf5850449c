import { describe, expect, test } from "vitest";
import { CellError } from "../../src/call/cell.js";
import { cellFunctionOf } from "../../src/call/cellFunctionOf.js";
import { blockOf, cellsOf, columnOf } from "../../src/call/column.js";
import { type NumberDefinition, optional, required } from "../../src/functions/definition.js";
import { period, resolvingPower, semiAmplitude } from "../../src/functions/quantities.js";
import { argumentOf } from "../call/door.js";

// A function that does not exist: the distance a star covers at a steady speed. All there is to write is this object.
const travel: NumberDefinition = {
  form: "number",
  name: "TRAVEL",
  question: "How far does it come?",
  inputs: [required(semiAmplitude), required(period), optional(resolvingPower, 2, "twice")],
  result: {
    quantity: { ...period, name: "way", kind: "length", unit: "km", example: 1, headers: [] },
    unit: "km",
  },
  compute: (rows, out, speed, time, times) => {
    for (let row = 0; row < rows; row++) out[row] = speed![row]! * time![row]! * times![row]!;
  },
  formula: "s = v t n",
  source: "kinematics",
  examples: [{ cells: ["1 m/s", "1 s"], gives: "0.002 km", because: "twice a metre" }],
};

describe("a definition is all that a new function needs", () => {
  const cellFunction = cellFunctionOf(travel);
  const once = (...given: Parameters<typeof argumentOf>[0][]) => cellsOf(cellFunction.once(given.map(argumentOf)));

  test("it has a name and a number of arguments", () => {
    expect(cellFunction).toMatchObject({ name: "BARY.TRAVEL", leastArguments: 2, mostArguments: 5 });
  });

  test("it reads units, uncertainties and headers", () => {
    expect(once("10 km/s", "1 h", 1)).toEqual([[36000]]);
    expect(once("10 km/s", "1 h")).toEqual([[72000]]);
    expect(once(10, 1, 3, "km/s; h; 1", "s [m]")).toEqual([[108e6]]);
    const [[value, sigma]] = once("10 ± 1 km/s", "1 h", 1) as [[number, number]];
    expect(value).toBe(36000);
    expect(sigma).toBeCloseTo(3600, 3);
  });

  test("it works on columns and filled down", () => {
    const speeds = blockOf([[1], [2], [3]]);
    const one = cellsOf(cellFunction.once([{ block: speeds }, argumentOf("1 s"), undefined, argumentOf("km/s; s")]));
    const down = cellFunction.eachRow(3, [
      { perRow: [columnOf([1, 2, 3])] },
      { fixed: argumentOf("1 s") },
      { fixed: undefined },
      { fixed: argumentOf("km/s; s") },
    ]);
    expect(one).toEqual([[2], [4], [6]]);
    expect(cellsOf(down)).toEqual(one);
  });

  test("its messages are made from it", () => {
    const [[error]] = once(10, "1 h") as [[CellError]];
    expect(error).toBeInstanceOf(CellError);
    expect(error.message).toBe(
      'TRAVEL: K is 10 with no unit; give its header (for example "K [m/s]") or type "10 m/s".',
    );
    const [[zero]] = once("10 m/s", "0 h") as [[CellError]];
    expect(zero.message).toMatch(/^TRAVEL: period is 0 or blank; it must be above 0/);
  });
});
