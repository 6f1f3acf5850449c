import { Decimal } from "decimal.js";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { NumberDefinition, QuantityInput } from "../../src/functions/definition.js";
import { definitions } from "../../src/functions/definitions.js";
import { isProblem } from "../../src/units/problem.js";
import { quantityText } from "../../src/units/quantityText.js";
import { readUnit } from "../../src/units/readUnit.js";
import { one, toBase, type Unit } from "../../src/units/unit.js";
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
// An instant has a zero of its own, a small part of a period is a large part of its orbit, and what the sky shows changes by
// no power law: test/call/times.test.ts, test/kernel/night.test.ts.
const takesInstant = ({ inputs }: NumberDefinition) =>
  inputs.some((input) => input.takes === "quantity" && input.quantity.kind === "instant");
const proportional = numeric.filter((one) => !takesInstant(one));
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
      fc.property(fc.constantFrom(...known.get(input.quantity.kind)!), factorFor(input), (unit, drawn) => {
        // Far from its example an uncertain star puts the mass out of reach.
        const factor = name === "MASSVISITS" ? drawn ** 0.05 : drawn;
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
  const example = toBase(readUnit(quantity.unit) as Unit, quantity.example);
  if (quantity.upper === undefined || quantity.kind === "speed") {
    const least = (quantity.lower?.at ?? 0) / example;
    return fc.double({ min: Math.max(0.01, least * 1.002), max: 100, noNaN: true });
  }
  const ends = [0.5, 1.9, ...[quantity.lower, quantity.upper].map((bound) => (bound ? bound.at / example : 0.5))];
  const [least, most] = [Math.max(ends[0]!, ends[2]! * 1.002), Math.min(ends[1]!, ends[3]! / 1.002)];
  return fc.double({ min: least, max: most, noNaN: true });
}

test("a number without a unit is the unit 1", () => {
  expect(numberFrom("SHIFTSPEED", 1e-4)).toBe(numberFrom("SHIFTSPEED", 1e-4, undefined, "z [1]"));
  expect(one.text).toBe("1");
});
