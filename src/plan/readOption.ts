import { quantityReader } from "../call/blockReader.js";
import { CellError } from "../call/cell.js";
import { type Column, columnOf } from "../call/column.js";
import { explain } from "../call/explain.js";
import { headerUnit, noHeader } from "../call/headerUnit.js";
import { type QuantityInput, required } from "../functions/definition.js";
import type { Quantity } from "../functions/quantity.js";
import { planDefinition } from "./planQuantities.js";

/** A quantity that was typed, "30 deg", in base units; or what is wrong with it, in the words of a function. */
export function readOption(quantity: Quantity, text: string): number | { readonly problem: string } {
  return readCells(required(quantity), columnOf([text.trim() === "" ? null : text]), undefined)[0]!;
}

/** The cells of a column under its header, likewise. */
export function readCells(
  input: QuantityInput,
  column: Column,
  header: string | undefined,
): (number | { readonly problem: string })[] {
  const hours = input.quantity.sexagesimal === "hours";
  const head =
    header === undefined
      ? noHeader
      : headerUnit(input.name, { text: header, address: undefined, isNumber: false }, hours);
  const reader = quantityReader({ input, columns: [column], headers: [head], single: false }, input, column.length);
  const problems: (string | undefined)[] = [];
  const definition = { ...planDefinition, inputs: [input] };
  reader.read(0, column.length, {
    value: (row, problem) => {
      problems[row] ??=
        problem instanceof CellError ? problem.message : explain(definition, problem).replace(/^PLAN: /, "");
    },
    sigma: () => undefined,
  });
  return Array.from(reader.base, (value, row) => {
    const problem = problems[row];
    return problem === undefined ? value : { problem };
  });
}
