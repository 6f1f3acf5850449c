import { Decimal } from "decimal.js";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { NumberDefinition, QuantityInput } from "../../src/functions/definition.js";
import { definitions } from "../../src/functions/definitions.js";
import { isProblem } from "../../src/units/problem.js";
import { quantityText } from "../../src/units/quantityText.js";
import { readUnit } from "../../src/units/readUnit.js";
import { one, type Unit } from "../../src/units/unit.js";
import { unitTable } from "../../src/units/unitTable.js";
import { exampleOf, type Given, numberFrom } from "./door.js";

Decimal.set({ precision: 60 });

const symbols = unitTable.flatMap(({ symbol, prefixes }) =>
  prefixes ? [symbol, ...["k", "M", "m", "u", "n", "c"].map((prefix) => `${prefix}${symbol}`)] : [symbol],
);
const compounds = ["m/s", "km/s", "cm.s**-1", "AU/d", "pc/yr", "km s-1", "10**3m/s", "Angstrom/ms", "solRad/h"];
const known = new Map<string, Unit[]>();
for (const text of [...symbols, ...compounds, "10**27kg", "2.5d", "10**-3"]) {
  const unit = readUnit(text);
  // Scales with a zero of their own and logarithms are not proportional.
  if (isProblem(unit) || unit.plus !== 0 || unit.logarithm) continue;
  known.set(unit.kind, [...(known.get(unit.kind) ?? []), unit]);
}

const numeric = definitions.filter((definition): definition is NumberDefinition => definition.form === "number");
// Times of another zero are not proportional, and a small part of a period is a large part of its orbit: test/call/times.test.ts.
const proportional = numeric.filter(({ settle, scales }) => !settle && !scales);
const inputs = proportional.flatMap((definition) =>
  definition.inputs.flatMap((input, index) =>
    input.takes === "quantity" ? [{ name: definition.name, definition, input, index, label: input.name }] : [],
  ),
);

/** The same amount in another unit, exact but for one rounding to the nearest double. */
function converted(value: number, from: Unit, to: Unit): number {
  return new Decimal(value).times(from.times).times(to.over).div(from.over).div(to.times).toNumber();
}

const ulp = 2 ** -52;

describe("the same quantity in any unit gives the same result", () => {
  test("there are units of every kind that a function takes", () => {
    for (const { input } of inputs) expect(known.get(input.quantity.kind)!.length).toBeGreaterThanOrEqual(2);
    expect(known.get("mass")!.length).toBeGreaterThan(10);
    expect(known.get("speed")!.length).toBeGreaterThan(5);
  });

  test.each(inputs)("$name: $label", ({ name, definition, input, index }) => {
    const own = readUnit(input.quantity.unit) as Unit;
    const values = (value: number, unit: Unit): Given[] =>
      definition.inputs.map((one, at): Given => {
        if (at !== index) return exampleOf(one);
        return quantityText({ value, upper: undefined, lower: undefined, unit });
      });
    fc.assert(
      fc.property(fc.constantFrom(...known.get(input.quantity.kind)!), factorFor(input), (unit, factor) => {
        const value = input.quantity.example * factor;
        const result = numberFrom(name, ...values(value, own));
        const again = numberFrom(name, ...values(converted(value, own, unit), unit));
        // How much a relative change of the input changes the result, from a tenth of a percent up and down.
        const [up, down] = [1.001, 0.999].map((part) => numberFrom(name, ...values(value * part, own))) as [
          number,
          number,
        ];
        const condition = Math.abs((up - down) / result) / 0.002;
        // 2 roundings of the conversion; the kernels' own are 2 of the result, whichever way the input came out.
        expect(Math.abs(again / result - 1)).toBeLessThanOrEqual(2 * ulp * (2 * condition + 2));
      }),
      { numRuns: 30 },
    );
  });

  test.each(numeric)("$name: the result in any unit", ({ name, inputs, result }) => {
    const values = inputs.map(exampleOf);
    const own = readUnit(result.unit) as Unit;
    const plain = numberFrom(name, ...values);
    // Instants in another zero, as conversions in test/units/readInstant.test.ts.
    for (const unit of known.get(result.quantity.kind) ?? []) {
      const asked = numberFrom(name, ...values, undefined, unit.text);
      expect(Math.abs(converted(asked, unit, own) / plain - 1), unit.text).toBeLessThanOrEqual(3 * ulp);
    }
  });

  test("asked for in its own unit, the result is the same to the last bit", () => {
    for (const { name, inputs, result } of numeric) {
      const values = inputs.map(exampleOf);
      expect(numberFrom(name, ...values, undefined, result.unit)).toBe(numberFrom(name, ...values));
    }
  });
});

/** Factors that leave the example inside its range, and a tenth of a percent beyond as well. */
function factorFor({ quantity }: QuantityInput): fc.Arbitrary<number> {
  const bounded = quantity.upper !== undefined && quantity.kind !== "speed";
  return fc.double({ min: bounded ? 0.5 : 0.01, max: bounded ? 1.9 : 100, noNaN: true });
}

test("a number without a unit is the unit 1", () => {
  expect(numberFrom("SHIFTSPEED", 1e-4)).toBe(numberFrom("SHIFTSPEED", 1e-4, undefined, "z [1]"));
  expect(one.text).toBe("1");
});
