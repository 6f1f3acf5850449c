import { describe, expect, test } from "vitest";
import { CellError } from "../../src/call/cell.js";
import { cellFunctionNames, findCellFunction } from "../../src/call/cellFunctions.js";
import type { Definition, Input } from "../../src/functions/definition.js";
import { definitions } from "../../src/functions/definitions.js";
import * as quantities from "../../src/functions/quantities.js";
import { kinds } from "../../src/units/kind.js";
import { isProblem } from "../../src/units/problem.js";
import { readQuantity } from "../../src/units/readQuantity.js";
import { readUnit } from "../../src/units/readUnit.js";
import { toBase, type Unit } from "../../src/units/unit.js";
import { call, type Given } from "../call/door.js";
import { promised } from "./promised.js";

const named = definitions.map((definition) => ({ name: definition.name, definition }));

/** An input as the table of functions writes it: a question mark where it may be left out. */
function written(input: Input): string {
  const optional =
    (input.takes === "word" && !input.required) ||
    (input.takes === "quantity" && input.fallback !== undefined) ||
    input.takes === "count";
  if (input.takes === "quantity" && input.repeats) return `${input.name} ...`;
  return optional ? `${input.name}?` : input.name;
}

describe("names and arguments are promises", () => {
  test("functions and inputs, in their order", () => {
    const table = Object.fromEntries(definitions.map(({ name, inputs }) => [name, inputs.map(written)]));
    expect(table).toEqual(promised);
  });

  test.each(named)("$name is a name that no cell has", ({ name }) => {
    expect(name).toMatch(/^[A-Z][A-Z0-9]{2,63}$/);
    // A1 to XFD1048576 are the cells of a worksheet (ISO/IEC 29500-1, 18.3.1.73 and 18.2.27).
    expect(name).not.toMatch(/^[A-Z]{1,3}[0-9]{1,7}$/);
    expect(cellFunctionNames).toContain(`BARY.${name}`);
    expect(findCellFunction(`bary.${name.toLowerCase()}`)?.name).toBe(`BARY.${name}`);
  });

  test("no name twice, no other name", () => {
    expect(new Set(cellFunctionNames).size).toBe(definitions.length);
    expect(findCellFunction("BARY.NOTHING")).toBeUndefined();
    expect(findCellFunction("REFLEX")).toBeUndefined();
  });

  test.each(named)("$name takes as many arguments as it says", ({ name, definition }) => {
    const cellFunction = findCellFunction(`BARY.${name}`)!;
    const { inputs, form } = definition;
    expect(cellFunction.leastArguments).toBe(inputs.filter((input) => !written(input).endsWith("?")).length);
    // Then headers and result header: TAG has no result header, UNITOF neither, CONSTANT no headers.
    const more = form === "number" || form === "conversion" ? 2 : name === "UNITOF" ? 0 : 1;
    const most = name === "NOISESUM" ? Number.POSITIVE_INFINITY : inputs.length + more;
    expect(cellFunction.mostArguments).toBe(most);
  });
});

describe.each(named)("$name", ({ definition }) => {
  test("says what it is and where it comes from", () => {
    const { question, formula, source, note, examples } = definition;
    expect(question).toMatch(/^[A-Z].*\?$/);
    expect(formula).not.toBe("");
    expect(source).not.toBe("");
    if (note !== undefined) expect(note).toMatch(/\.$/);
    expect(examples.length).toBeGreaterThan(0);
    for (const { because } of examples) expect(because).not.toBe("");
  });

  test("its inputs are quantities with units, bounds with reasons, words with meanings", () => {
    const names = definition.inputs.map(({ name }) => name);
    expect(new Set(names).size).toBe(names.length);
    for (const input of definition.inputs) {
      if (input.takes === "quantity") {
        expectQuantity(input.quantity);
        if (input.fallback !== undefined) expect(input.fallbackText).not.toBe(undefined);
      } else if (input.takes === "word") {
        expect(input.words.length).toBeGreaterThan(1);
        for (const { word, meaning } of input.words) {
          expect(word).toMatch(/^[A-Za-z][A-Za-z0-9]*(-[a-z]+)?$/);
          expect(meaning).not.toBe("");
        }
      } else if (input.takes === "count") {
        expect(input.meaning).not.toBe("");
      }
    }
    if (definition.form === "number") {
      expectQuantity(definition.result.quantity);
      expect((readUnit(definition.result.unit) as Unit).kind).toBe(definition.result.quantity.kind);
    }
  });

  test.each(definition.examples)("gives $gives for $cells", ({ cells, result, gives }) => {
    const found = exampleCell(definition, cells, result);
    if (typeof found === "string") return expect(found).toBe(gives);
    const expected = readQuantity(gives);
    if (isProblem(expected)) throw new Error(`"${gives}" is no quantity`);
    // Half a unit of the last printed digit.
    const [, decimals = "", exponent = "0"] = /^-?\d+(?:\.(\d+))?(?:[eE]([+-]?\d+))?/.exec(gives)!;
    const half = 0.5 * 10 ** (Number(exponent) - decimals.length);
    expect(found).toBeTypeOf("number");
    expect(Math.abs((found as number) - expected.value)).toBeLessThanOrEqual(half * (1 + 1e-9));
    // It is printed in the unit that was asked for, or the function's own.
    const unit = result ?? (definition.form === "number" ? definition.result.unit : expected.unit?.text);
    expect(expected.unit?.text ?? "1").toBe(unit ?? "1");
  });
});

function exampleCell({ name, inputs, form }: Definition, cells: readonly string[], result: string | undefined) {
  const given: Given[] = Array.from({ length: Math.max(inputs.length, cells.length) }, (_, index) => cells[index]);
  const before = form === "lookup" ? [] : [undefined];
  const [[cell]] = call(name, ...given, ...(result === undefined ? [] : [...before, result])) as [[unknown]];
  if (cell instanceof CellError) throw new Error(cell.message);
  return cell;
}

function expectQuantity(quantity: (typeof quantities)["period"]): void {
  const unit = readUnit(quantity.unit);
  if (isProblem(unit)) throw new Error(`${quantity.name}: "${quantity.unit}" is no unit`);
  expect(unit.kind).toBe(quantity.kind);
  expect(Object.keys(kinds)).toContain(quantity.kind);
  expect(quantity.meaning).not.toBe("");
  expect(quantity.step).toBeGreaterThan(0);
  const example = toBase(unit, quantity.example);
  const { lower, upper } = quantity;
  if (lower) expect(lower.open ? example > lower.at : example >= lower.at).toBe(true);
  if (upper) expect(upper.open ? example < upper.at : example <= upper.at).toBe(true);
  for (const bound of [lower, upper]) {
    if (!bound) continue;
    // "it must be above TEXT, because REASON; for example ..."
    expect(bound.text).not.toBe("");
    expect(bound.reason).toMatch(/^[a-z].*[^.]$/);
  }
}

describe("quantities", () => {
  test.each(Object.values(quantities))("$name is whole", (quantity) => expectQuantity(quantity));
});
