import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { kernels } from "./kernels.js";

describe.each(kernels)("$name over columns", ({ scalar, batch, inputs }) => {
  const cell = (index: number) =>
    fc.oneof(
      { weight: 6, arbitrary: fc.constantFrom(...inputs[index].inside) },
      {
        weight: 3,
        arbitrary: fc.double({ min: 0, max: 1, noNaN: true }).map((part) => part * inputs[index].inside[0]),
      },
      { weight: 1, arbitrary: fc.constantFrom(...inputs[index].outside, Number.NaN) },
    );
  const row = fc.tuple(...inputs.map((_, index) => cell(index)));

  test("gives the bits of the scalar, row by row, and a bad row spoils only itself", () => {
    fc.assert(
      fc.property(fc.array(row, { maxLength: 30 }), (rows) => {
        const columns = inputs.map((_, index) => Float64Array.from(rows, (values) => values[index]));
        const out = new Float64Array(rows.length);
        batch(rows.length, out, ...columns);
        expect([...out]).toStrictEqual(rows.map((values) => scalar(...values)));
      }),
      { numRuns: 100 },
    );
  });

  test("fills the first rows only", () => {
    const columns = inputs.map((input) => new Float64Array(4).fill(input.inside[0]));
    const out = new Float64Array(4).fill(-7);
    batch(2, out, ...columns);
    expect([...out]).toStrictEqual([out[0], out[0], -7, -7]);
    expect(out[0]).not.toBe(-7);
  });
});
