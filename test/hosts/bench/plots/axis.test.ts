import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { axisOver, partOf, ticksOf, valueAt } from "../../../../src/hosts/bench/page/plots/draw/axis.js";

const axis = (from: number, to: number, isLog = false) => ({ label: "x", unit: "", isLog, from, to });

describe("ticks", () => {
  // Worked out by hand: steps of 1, 2 or 5 times a power of ten.
  const cases: readonly (readonly [number, number, boolean, number, readonly string[]])[] = [
    [0, 10, false, 5, ["0", "2", "4", "6", "8", "10"]],
    [-1, 1, false, 4, ["−1.0", "−0.5", "0", "0.5", "1.0"]],
    [0.001, 1000, true, 10, ["0.001", "0.01", "0.1", "1", "10", "100", "1000"]],
    [1e-9, 1e9, true, 4, ["10⁻⁹", "0.0001", "10", "10⁶"]],
    [2, 8, true, 3, ["2", "4", "6", "8"]],
    [0, 3e7, false, 3, ["0", "10⁷", "2·10⁷", "3·10⁷"]],
  ];
  test.each(cases)("from %d to %d, logarithmic %s, at most %d", (from, to, isLog, most, texts) => {
    expect(ticksOf(axis(from, to, isLog), most).map(({ text }) => text)).toEqual(texts);
  });

  test("they lie on the axis, ascend, and are few", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.double({ min: 1e-3, max: 1e6, noNaN: true }),
        fc.integer({ min: 1, max: 12 }),
        (from, size, most) => {
          const values = ticksOf(axis(from, from + size), most).map(({ value }) => value);
          expect(values.length).toBeLessThanOrEqual(most + 1);
          values.forEach((value, index) => {
            expect(value).toBeGreaterThanOrEqual(from - 1e-8 * size - 1e-9 * Math.abs(from));
            expect(value).toBeLessThanOrEqual(from + size * (1 + 1e-8) + 1e-9 * Math.abs(from));
            if (index > 0) expect(value).toBeGreaterThan(values[index - 1] as number);
          });
        },
      ),
    );
  });
});

describe("an axis over values", () => {
  test("holds them all, and leaves out what a logarithm cannot take", () => {
    const { from, to } = axisOver("K", "m/s", true, [Number.NaN, -1, 0, 0.1, 100]);
    expect(from).toBeLessThan(0.1);
    expect(from).toBeGreaterThan(0.01);
    expect(to).toBeGreaterThan(100);
    expect(to).toBeLessThan(1000);
  });

  test("of nothing, and of one value, still has a length", () => {
    expect(axisOver("x", "", false, [])).toMatchObject({ from: 0, to: 1 });
    const { from, to } = axisOver("x", "", false, [5]);
    expect(from).toBeLessThan(5);
    expect(to).toBeGreaterThan(5);
  });

  test("places values and finds them again", () => {
    fc.assert(
      fc.property(fc.double({ min: 0.001, max: 1, noNaN: true }), fc.boolean(), (part, isLog) => {
        const over = axis(0.01, 1000, isLog);
        expect(partOf(over, valueAt(over, part))).toBeCloseTo(part, 9);
      }),
    );
  });
});
