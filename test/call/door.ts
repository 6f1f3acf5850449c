import type { Cell } from "../../src/call/cell.js";
import { CellError } from "../../src/call/cell.js";
import type { Argument, CellFunction } from "../../src/call/cellFunction.js";
import { findCellFunction } from "../../src/call/cellFunctions.js";
import { blockOf, cellsOf } from "../../src/call/column.js";
import type { Input } from "../../src/functions/definition.js";
import type { Quantity } from "../../src/functions/quantity.js";

/** What a test hands over for one argument: a cell, a rectangle of rows, a rectangle that stands at an address, or nothing. */
export type Given = Cell | undefined | readonly (readonly Cell[])[] | Placed;

export interface Placed {
  readonly cells: readonly (readonly Cell[])[];
  readonly address: string;
}

/** Cells below each other. */
export function column(cells: readonly Cell[]): Cell[][] {
  return cells.map((cell) => [cell]);
}

/** A row of headers, as a worksheet hands over B$1:D$1. */
export function headerRow(address: string, ...cells: readonly Cell[]): Placed {
  return { cells: [cells], address };
}

export function argumentOf(given: Given): Argument {
  if (given === undefined) return undefined;
  if (isPlaced(given)) return { block: blockOf(given.cells), address: given.address };
  return { block: blockOf(Array.isArray(given) ? (given as Cell[][]) : [[given as Cell]]) };
}

export function isPlaced(given: Given): given is Placed {
  return typeof given === "object" && given !== null && "address" in given;
}

export function functionNamed(name: string): CellFunction {
  const found = findCellFunction(`BARY.${name}`);
  if (!found) throw new Error(`no function ${name}`);
  return found;
}

/** The example value of a quantity as text that carries its unit. */
export function exampleText({ example, unit }: Quantity): string {
  return unit === "1" ? String(example) : `${example} ${unit}`;
}

/** What a test gives for an input of which any good value will do: its example, and nothing where it may be left out. */
export function exampleOf(input: Input): Given {
  if (input.takes === "quantity") return exampleText(input.quantity);
  return input.takes === "word" && input.required ? input.words[0]!.word : undefined;
}

/** All cells that a call gives, row by row. */
export function call(name: string, ...given: readonly Given[]): Cell[][] {
  return cellsOf(functionNamed(name).once(given.map(argumentOf)));
}

/** The only cell that a call gives. */
export function cellOf(name: string, ...given: readonly Given[]): Cell {
  const cells = call(name, ...given);
  if (cells.length !== 1 || cells[0]!.length !== 1)
    throw new Error(`${name} gave ${cells.length} x ${cells[0]?.length}`);
  return cells[0]![0]!;
}

/** The number that a call gives; anything else is a failure of the test, told in the error's own words. */
export function numberFrom(name: string, ...given: readonly Given[]): number {
  const cell = cellOf(name, ...given);
  if (typeof cell !== "number")
    throw new Error(cell instanceof CellError ? `${cell.code} ${cell.message}` : String(cell));
  return cell;
}

/** The error that a call gives. */
export function errorFrom(name: string, ...given: readonly Given[]): CellError {
  const cell = cellOf(name, ...given);
  if (!(cell instanceof CellError)) throw new Error(`${name} gave ${String(cell)} instead of an error`);
  return cell;
}
