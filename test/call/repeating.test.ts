import { describe, expect, test } from "vitest";
import { cellsOf, columnOf } from "../../src/call/column.js";
import { tellCall } from "../../src/call/tellCall.js";
import { definitions } from "../../src/functions/definitions.js";
import { argumentOf, call, type cellOf, errorFrom, functionNamed, headerRow, numberFrom } from "./door.js";

const sum = (...given: Parameters<typeof call> extends [string, ...infer Given] ? Given : never) =>
  numberFrom("NOISESUM", ...given);

describe("any number of terms", () => {
  test("without headers", () => {
    expect(sum("3 m/s")).toBe(3);
    expect(sum("3 m/s", "4 m/s")).toBe(5);
    // 1 + 4 + 9 + ... + 24^2 = 4900 (the one square pyramid that is a square).
    expect(sum(...Array.from({ length: 24 }, (_, index) => `${index + 1} m/s`))).toBe(70);
  });

  test("under their headers, with the header of the result, and with the result's alone", () => {
    const headers = headerRow("B$1", "Photon [m/s]", "Floor [cm/s]", "Jitter [km/s]");
    expect(sum(3, 400, 0.012, headers)).toBe(13);
    expect(sum(3, 400, 0.012, headers, "Total [km/s]")).toBe(0.013);
    expect(sum(3, 400, 0.012, "m/s; cm/s; km/s", "cm/s")).toBe(1300);
    expect(sum("3 m/s", "4 m/s", undefined, "cm/s")).toBe(500);
    expect(sum("3 m/s", "4 m/s", undefined, undefined)).toBe(5);
  });

  test("over columns, in one call and filled down", () => {
    const [first, second] = [
      [3, 6, 5],
      [4, 8, "n/a"],
    ];
    const one = call(
      "NOISESUM",
      first!.map((cell) => [cell]),
      second!.map((cell) => [cell]),
      "m/s; m/s",
    );
    expect(one.slice(0, 2)).toEqual([[5], [10]]);
    const down = functionNamed("NOISESUM").eachRow(3, [
      { perRow: [columnOf(first!)] },
      { perRow: [columnOf(second!)] },
      { fixed: argumentOf("m/s; m/s") },
      { fixed: argumentOf("cm/s") },
    ]);
    expect(cellsOf(down).slice(0, 2)).toEqual([[500], [1000]]);
    const last = cellsOf(down)[2]![0] as { message: string };
    expect(last.message).toBe('NOISESUM: noise 2 is "n/a", not a number; a speed is needed, for example 1.2 m/s.');
  });

  test("headers that differ from row to row", () => {
    const down = functionNamed("NOISESUM").eachRow(2, [
      { perRow: [columnOf([3, 3])] },
      { perRow: [columnOf([4, 4])] },
      { perRow: [columnOf(["m/s; m/s", "km/s; km/s"])] },
    ]);
    expect(cellsOf(down)).toEqual([[5], [5000]]);
  });

  test("with an uncertainty as a text", () => {
    // dsigma = (3 x 0.5) / 5.
    const [[value, sigma]] = call("NOISESUM", "3 ± 0.5 m/s", "4 m/s") as [[number, number]];
    expect(value).toBe(5);
    expect(sigma).toBeCloseTo(0.3, 9);
  });

  test("say in which unit they are", () => {
    expect(functionNamed("NOISESUM").unitOf!(["3 m/s", "4 m/s", undefined, "km/s"].map(argumentOf))).toBe("km/s");
    expect(functionNamed("NOISESUM").unitOf!(["3 m/s", "4 m/s", "1 km/s"].map(argumentOf))).toBe("m/s");
  });

  test("are told one by one", () => {
    const definition = definitions.find(({ name }) => name === "NOISESUM")!;
    const story = tellCall(definition, ["3 ± 1 m/s", "4 ± 1 m/s", "0 m/s", undefined, "cm/s"].map(argumentOf));
    expect(story.inputs.map(({ name, cell }) => [name, cell])).toEqual([
      ["noise", "3 ± 1 m/s"],
      ["noise 2", "4 ± 1 m/s"],
      ["noise 3", "0 m/s"],
    ]);
    // Parts of the variance: 9/25 and 16/25.
    expect(story.inputs[0]!.share).toBeCloseTo(0.36, 9);
    expect(story).toMatchObject({ result: 500, unit: "cm/s" });
  });
});

describe("what cannot be a term", () => {
  test.each([
    [
      ["3 m/s", 4],
      'NOISESUM: noise 2 is 4 with no unit; give its header (for example "Noise 2 [m/s]") or type "4 m/s".',
    ],
    [
      ["3 m/s", "-4 m/s"],
      "NOISESUM: noise 2 is -4 m/s; it must be at least 0, because a noise has no sign; for example 1.2 m/s.",
    ],
    [
      ["3 m/s", undefined, "4 m/s"],
      "NOISESUM: noise 2 is missing; the arguments are noise, noise 2, noise 3, [headers], [result].",
    ],
    [
      ["3 m/s", [[4, 5]], "m/s; m/s"],
      "NOISESUM: noise 2 is 1 x 2 cells; it takes one column; give each as an argument of its own: B2, C2, D2.",
    ],
    [[3, 4, "m/s"], "NOISESUM: 1 header cell was given for 2 inputs; give one for each input, in their order."],
    [["m/s"], 'NOISESUM: noise is "m/s", not a number; a speed is needed, for example 1.2 m/s.'],
    [
      ["3 m/s", "photon noise"],
      'NOISESUM: noise 2 is "photon noise", not a number; a speed is needed, for example 1.2 m/s.',
    ],
    [["3 m/s", "4 s"], 'NOISESUM: noise 2 is "4 s", a duration; a speed is needed, for example 1.2 m/s.'],
  ])("%j", (given, message) => {
    expect(errorFrom("NOISESUM", ...(given as Parameters<typeof cellOf>[1][])).message).toBe(message);
  });
});
