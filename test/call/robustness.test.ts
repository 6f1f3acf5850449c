import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Cell, CellError } from "../../src/call/cell.js";
import { columnOf } from "../../src/call/column.js";
import { definitions } from "../../src/functions/definitions.js";
import { unitTable } from "../../src/units/unitTable.js";
import { argumentOf, call, functionNamed, type Given } from "./door.js";

const foreignErrors = (["#REF!", "#DIV/0!", "#NAME?", "#NUM!", "#NULL!", "#N/A", "#VALUE!"] as const).map(
  (code) => new CellError(code, "elsewhere", "an error of another formula"),
);
const number = fc.oneof(
  fc.constantFrom(0, -0, 1, -1, 0.5, 90, 1e308, -1e308, 5e-324, -5e-324, 1e-160, 1e160, Number.MAX_VALUE),
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.double({ min: 0, max: 1000, noNaN: true }),
);
const unit = fc.constantFrom(
  ...unitTable.map(({ symbol }) => symbol),
  "JD_UTC",
  "BJD_TDB-2450000",
  "log(m)",
  "M",
  "1E300m",
);
const quantityText = fc
  .tuple(number, fc.option(number, { nil: undefined }), fc.option(unit, { nil: "" }))
  .map(([value, sigma, symbol]) => `${value}${sigma === undefined ? "" : ` \u00b1 ${Math.abs(sigma)}`} ${symbol}`);
const headerText = fc.tuple(fc.string({ maxLength: 6 }), unit).map(([name, symbol]) => `${name} [${symbol}]`);
const text = fc.oneof(
  quantityText,
  headerText,
  unit,
  fc.constantFrom(
    "",
    " ",
    "linear",
    "relativistic",
    "Morton2000",
    "c",
    "GM_sun",
    "__proto__",
    "constructor",
    "toString",
    ";",
  ),
  fc.string({ unit: "binary", maxLength: 12 }),
  fc.string({ maxLength: 400 }),
);
const cell: fc.Arbitrary<Cell> = fc.oneof(
  { weight: 4, arbitrary: number },
  { weight: 5, arbitrary: text },
  { weight: 1, arbitrary: fc.boolean() },
  { weight: 1, arbitrary: fc.constant(null) },
  { weight: 1, arbitrary: fc.constantFrom(...foreignErrors) },
);
const rectangle = fc
  .tuple(fc.integer({ min: 1, max: 3 }), fc.integer({ min: 1, max: 4 }))
  .chain(([rows, columns]) =>
    fc.array(fc.array(cell, { minLength: columns, maxLength: columns }), { minLength: rows, maxLength: rows }),
  );
const given: fc.Arbitrary<Given> = fc.oneof(
  { weight: 5, arbitrary: cell },
  { weight: 1, arbitrary: rectangle },
  { weight: 1, arbitrary: fc.constant(undefined) },
);

function expectAnswer(name: string, answer: Cell, at: string): void {
  if (answer instanceof CellError) {
    if (foreignErrors.includes(answer)) return;
    expect(["#VALUE!", "#N/A"], at).toContain(answer.code);
    const { message } = answer;
    expect(message.length, at).toBeLessThanOrEqual(250);
    expect(message.startsWith(`${name}: `), `${at}: ${message}`).toBe(true);
    expect(message.replace(/"[^"]*"/g, ""), at).not.toMatch(/\b(NaN|undefined)\b|\[object/);
    return;
  }
  expect(answer, at).not.toBe("");
  if (typeof answer === "number") expect(Number.isFinite(answer), `${at}: ${answer}`).toBe(true);
  else if (typeof answer === "string") expect(answer, at).not.toMatch(/^(NaN|-?Infinity)|[ +-](NaN|Infinity)\b/);
  else throw new Error(`${at}: ${String(answer)}`);
}

const shown = (arguments_: readonly Given[]) => JSON.stringify(arguments_);

describe("whatever the cells hold", () => {
  test.each(definitions.map(({ name, inputs }) => ({ name, most: inputs.length + 3 })))(
    "$name answers every cell with a number, a text or a message",
    ({ name, most }) => {
      fc.assert(
        fc.property(fc.array(given, { maxLength: most }), (arguments_) => {
          for (const row of call(name, ...arguments_)) {
            const [value, ...sigmas] = row;
            expectAnswer(name, value!, `${name}(${shown(arguments_)})`);
            for (const sigma of sigmas) if (sigma !== null) expectAnswer(name, sigma, `${name}(${shown(arguments_)})`);
            // Beside a value that failed there is its error or nothing, never an uncertainty.
            if (value instanceof CellError) {
              for (const sigma of sigmas) if (sigma !== null) expect(sigma, shown(arguments_)).toBe(value);
            }
          }
        }),
        { numRuns: 150 },
      );
    },
  );

  // Rarely does random garbage get past its reading; here all but one argument are good.
  const goods = definitions.map((definition) => ({
    name: definition.name,
    good: [...definition.examples[0].cells] as Cell[],
    result: definition.examples[0].result,
    size: definition.inputs.length,
  }));
  test.each(goods)("$name with one argument spoilt", ({ name, good, result, size }) => {
    const place = fc.integer({ min: 0, max: size + 1 });
    fc.assert(
      fc.property(place, fc.oneof(quantityText, number, headerText, unit), number, (index, spoilt, sigma) => {
        const arguments_: Given[] = [...good];
        while (arguments_.length < size) arguments_.push(undefined);
        if (result !== undefined && size + 1 <= functionNamed(name).mostArguments) {
          arguments_[name === "CONSTANT" ? size : size + 1] = result;
        }
        arguments_[index] = index < good.length && typeof spoilt === "number" ? [[spoilt, sigma]] : spoilt;
        for (const row of call(name, ...arguments_)) {
          for (const answer of row) if (answer !== null) expectAnswer(name, answer, `${name}(${shown(arguments_)})`);
        }
      }),
      { numRuns: 200 },
    );
  });

  test("filled down as well", () => {
    const width = 3;
    fc.assert(
      fc.property(
        fc.constantFrom(...definitions.map(({ name }) => name)),
        fc.array(fc.array(cell, { minLength: width, maxLength: width }), { minLength: 1, maxLength: 8 }),
        fc.array(fc.boolean(), { minLength: 8, maxLength: 8 }),
        (name, columns, fixed) => {
          const arguments_ = columns.map((cells, index) =>
            fixed[index] ? { fixed: argumentOf(cells[0]) } : { perRow: [columnOf(cells)] },
          );
          const block = functionNamed(name).eachRow(width, arguments_);
          expect(block.rows).toBe(width);
          for (const { length } of block.columns) expect(length).toBe(width);
        },
      ),
      { numRuns: 400 },
    );
  });
});
