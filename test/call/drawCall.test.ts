import { describe, expect, test } from "vitest";
import type { Cell } from "../../src/call/cell.js";
import { blockOf } from "../../src/call/column.js";
import { describeDraws } from "../../src/call/draw/describeDraws.js";
import { normalNumbers, splitNormal } from "../../src/call/draw/normalNumbers.js";
import { randomNumbers, seedState, xoshiro128 } from "../../src/call/draw/randomNumbers.js";
import { type CallDraws, drawCall } from "../../src/call/drawCall.js";
import { tellCall } from "../../src/call/tellCall.js";
import { type NumberDefinition, required } from "../../src/functions/definition.js";
import { definitions } from "../../src/functions/definitions.js";
import { above, type Quantity } from "../../src/functions/quantity.js";

const count = 10_000;

describe("random numbers", () => {
  test("xoshiro128** from the state 1, 2, 3, 4", () => {
    const next = xoshiro128([1, 2, 3, 4]);
    // Worked out from the published recurrence with whole numbers of any size (Python), apart from this code.
    expect(Array.from({ length: 6 }, next)).toEqual([11520, 0, 5927040, 70819200, 2031721883, 1637235492]);
  });

  test("splitmix64 seeds the state", () => {
    // First outputs for the seed 1234567: 6457827717110365317, 3203168211198807973 (worked out with whole numbers of any size, Python).
    const [a, b, c, d] = seedState(1_234_567).map(BigInt) as [bigint, bigint, bigint, bigint];
    expect([(b << 32n) | a, (d << 32n) | c]).toEqual([6457827717110365317n, 3203168211198807973n]);
  });

  test("uniform numbers fill the unit interval evenly", () => {
    const random = randomNumbers(1);
    const values = Float64Array.from({ length: count }, random);
    expect(Math.min(...values)).toBeGreaterThanOrEqual(0);
    expect(Math.max(...values)).toBeLessThan(1);
    // Chi-squared over 20 bins: 43.8 is passed with probability 0.001 (19 degrees of freedom, tables).
    const bins = new Array(20).fill(0);
    for (const value of values) bins[Math.floor(value * 20)]++;
    expect(bins.reduce((sum, bin) => sum + (bin - count / 20) ** 2 / (count / 20), 0)).toBeLessThan(43.8);
  });

  test("the same seed gives the same numbers, another seed others", () => {
    const first = (seed: number) => Array.from({ length: 4 }, randomNumbers(seed));
    expect(first(5)).toEqual(first(5));
    expect(first(5)).not.toEqual(first(6));
  });

  test("normal numbers have the moments of the normal distribution", () => {
    const normal = normalNumbers(randomNumbers(2));
    const values = Array.from({ length: count }, normal);
    const moment = (power: number) => values.reduce((sum, value) => sum + value ** power, 0) / count;
    // E x = 0, x^2 = 1, x^3 = 0, x^4 = 3; five standard errors of each estimate.
    expect(Math.abs(moment(1))).toBeLessThan(5 / Math.sqrt(count));
    expect(Math.abs(moment(2) - 1)).toBeLessThan(5 * Math.sqrt(2 / count));
    expect(Math.abs(moment(3))).toBeLessThan(5 * Math.sqrt(15 / count));
    expect(Math.abs(moment(4) - 3)).toBeLessThan(5 * Math.sqrt(96 / count));
  });

  test("the split normal has the mean and variance of Wallis 2014", () => {
    const random = randomNumbers(3);
    const normal = normalNumbers(random);
    const [upper, lower] = [2, 0.5];
    const values = Array.from({ length: count }, () => splitNormal(random, normal, 10, upper, lower));
    const mean = values.reduce((sum, value) => sum + value, 0) / count;
    const variance = values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / count;
    const expected = (1 - 2 / Math.PI) * (upper - lower) ** 2 + upper * lower;
    expect(Math.abs(mean - 10 - Math.sqrt(2 / Math.PI) * (upper - lower))).toBeLessThan(
      5 * Math.sqrt(expected / count),
    );
    expect(Math.abs(variance / expected - 1)).toBeLessThan(0.1);
    // The mode parts the probability as the widths: 2 / 2.5 lie above it.
    expect(Math.abs(values.filter((value) => value > 10).length / count - 0.8)).toBeLessThan(
      5 * Math.sqrt(0.16 / count),
    );
  });
});

const plain: Quantity = {
  name: "x",
  meaning: "a number",
  kind: "ratio",
  lower: undefined,
  upper: undefined,
  unit: "1",
  example: 1,
  step: 1,
  plausible: undefined,
  headers: [],
};

function definitionOf(compute: (a: number, b: number) => number, quantity: Quantity = plain): NumberDefinition {
  const { REFLEX } = Object.fromEntries(definitions.map((definition) => [definition.name, definition]));
  return {
    ...(REFLEX as NumberDefinition),
    name: "TRIAL",
    inputs: [required({ ...quantity, name: "a" }), required({ ...plain, name: "b" })],
    result: { quantity: plain, unit: "1" },
    compute: (rows, out, a, b) => {
      for (let row = 0; row < rows; row++) out[row] = compute(a![row]!, b![row]!);
    },
  };
}

function draw(definition: NumberDefinition, cells: readonly Cell[], seed = 7): CallDraws | undefined {
  return drawCall(
    tellCall(
      definition,
      cells.map((cell) => ({ block: blockOf([[cell]]) })),
    ),
    seed,
    count,
  );
}

describe("draws of a call", () => {
  test("a linear function: mean and deviation are those of the inputs, within the sampling error", () => {
    const drawn = draw(
      definitionOf((a, b) => 3 * a - 2 * b),
      ["10 \u00b1 0.4", "5 \u00b1 0.3"],
    )!;
    const deviation = Math.hypot(3 * 0.4, 2 * 0.3);
    expect(drawn).toMatchObject({ draws: count, rejected: 0, unit: "1" });
    expect(Math.abs(drawn.mean - 20)).toBeLessThan((4 * deviation) / Math.sqrt(count));
    expect(Math.abs(drawn.deviation / deviation - 1)).toBeLessThan(4 / Math.sqrt(2 * count));
    // Standard errors of quantiles of the normal distribution: (p (1 - p) / n)^(1/2) / density.
    const errors = [0.0276, 0.0151, 0.0125, 0.0151, 0.0276];
    for (const [index, sigmas] of [-2, -1, 0, 1, 2].entries()) {
      expect(Math.abs((drawn.percentiles[index]! - 20) / deviation - sigmas)).toBeLessThan(4 * errors[index]!);
    }
  });

  test("a product: mean mu nu, variance mu^2 tau^2 + nu^2 sigma^2 + sigma^2 tau^2 (Goodman 1960, JASA 55, 708)", () => {
    const drawn = draw(
      definitionOf((a, b) => a * b),
      ["3 \u00b1 1", "2 \u00b1 0.5"],
    )!;
    const variance = 9 * 0.25 + 4 * 1 + 1 * 0.25;
    expect(Math.abs(drawn.mean - 6)).toBeLessThan(4 * Math.sqrt(variance / count));
    expect(Math.abs(drawn.deviation / Math.sqrt(variance) - 1)).toBeLessThan(0.05);
  });

  test("draws are cut off at the bounds of a quantity, and counted", () => {
    const positive = { ...plain, lower: above(0, "0", "it is so") };
    const drawn = draw(
      definitionOf((a) => a, positive),
      ["1 \u00b1 1", 1],
    )!;
    // Truncated at -1 deviation: P(x < 0) = 0.158655, mean mu + sigma phi(1) / (1 - 0.158655) = 1.287600 (tables).
    const rejectedPart = drawn.rejected / (drawn.rejected + count);
    expect(Math.abs(rejectedPart - 0.158655)).toBeLessThan(0.015);
    expect(Math.abs(drawn.mean - 1.2876)).toBeLessThan(0.033);
    expect(drawn.histogram.from).toBeGreaterThan(0);
  });

  test("a result that hardly any draw gives is not drawn", () => {
    const positive = { ...plain, lower: above(0, "0", "it is so") };
    expect(
      draw(
        definitionOf((a) => (a < 1 ? a : Number.NaN), positive),
        ["0.5 \u00b1 1000", 1],
      ),
    ).toBeUndefined();
  });

  test("nothing is drawn without uncertainties or without an answer", () => {
    expect(
      draw(
        definitionOf((a, b) => a * b),
        [3, 2],
      ),
    ).toBeUndefined();
    expect(
      draw(
        definitionOf((a, b) => a * b),
        ["3 \u00b1 1", "x"],
      ),
    ).toBeUndefined();
  });

  test("K of a planet near the first order where the uncertainties are small", () => {
    const reflex = definitions.find(({ name }) => name === "REFLEX")!;
    const cells = ["10 d", "1 \u00b1 0.02 solMass", "1 +0.01 -0.01 jupiterMass"];
    const story = tellCall(
      reflex,
      cells.map((cell) => ({ block: blockOf([[cell]]) })),
    );
    const drawn = drawCall(story, 11)!;
    expect(drawn.unit).toBe("m/s");
    expect(Math.abs(drawn.deviation / (story.upper as number) - 1)).toBeLessThan(0.03);
    expect(Math.abs(drawn.mean / (story.result as number) - 1)).toBeLessThan(0.001);
  });

  test("a logarithm is drawn as a logarithm", () => {
    const drawn = draw(
      definitionOf((a) => Math.log(a)),
      ["0 \u00b1 0.2 dex", 1],
    );
    if (drawn) expect(Math.abs(drawn.deviation / (0.2 * Math.LN10) - 1)).toBeLessThan(0.03);
    expect(drawn === undefined || drawn.rejected === 0).toBe(true);
  });
});

describe("describing draws", () => {
  test("quantiles between whole places, the histogram without its tails", () => {
    const { mean, deviation, percentiles, histogram } = describeDraws(
      Float64Array.from({ length: 1001 }, (_, index) => 1000 - index),
    );
    expect(mean).toBe(500);
    // Sample deviation of 0 .. n - 1: (n (n + 1) / 12)^(1/2).
    expect(deviation).toBeCloseTo(Math.sqrt((1001 * 1002) / 12), 9);
    expect(percentiles[2]).toBe(500);
    expect(percentiles[0]).toBeCloseTo(22.750132, 5);
    expect(histogram.counts.reduce((sum, each) => sum + each, 0)).toBe(997);
    expect([histogram.from, histogram.to]).toEqual([2, 998]);
  });
});
