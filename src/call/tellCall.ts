import type { Definition, Input } from "../functions/definition.js";
import { kinds } from "../units/kind.js";
import { symbolOf } from "../units/quantityText.js";
import { baseSlope, one, toBaseOf, type Unit } from "../units/unit.js";
import { type Cell, CellError } from "./cell.js";
import type { Argument } from "./cellFunction.js";
import { cellFunctionOf } from "./cellFunctionOf.js";
import { blockOf, cellAt, sliceColumn } from "./column.js";
import { headerCells } from "./headerCells.js";
import { noHeader } from "./headerUnit.js";
import { callInputs, type InputColumns } from "./inputColumns.js";
import { type CellReading, readCell } from "./readCell.js";
import { readSigma } from "./readSigma.js";
import { orderedCall } from "./repeatedCall.js";

/** One call of one row told in full: what went in, by which formula, what came out, and whose doubt it carries. */
export interface CallStory {
  readonly definition: Definition;
  readonly inputs: readonly ToldInput[];
  readonly result: Cell;
  readonly upper: Cell;
  readonly lower: Cell;
  /** VOUnits spelling; undefined where the result is a text or an error. */
  readonly unit: string | undefined;
}

export interface ToldInput {
  readonly name: string;
  /** As it stands in the worksheet; null where it is blank or was left out. */
  readonly cell: Cell;
  /** The header cell that states its unit. */
  readonly header: { readonly text: string; readonly address: string | undefined } | undefined;
  /** What stands in for an input that was left out: "90 deg, edge-on". */
  readonly assumed: string | undefined;
  /** Undefined where it cannot be read, or is no quantity. */
  readonly reading: CellReading | undefined;
  /** The same in the base unit of its kind. */
  readonly base: { readonly value: number; readonly unit: string } | undefined;
  /** Its part in the variance of the result, 0 to 1; undefined where no uncertainty was given. */
  readonly share: number | undefined;
}

/** `row` counts within the call where its inputs are columns. */
export function tellCall(called: Definition, given: readonly Argument[], row = 0): CallStory {
  const { definition, parameters } = orderedCall(called, given);
  const count = definition.inputs.length;
  const ofRow = parameters.map((parameter, index) => (index < count ? rowOf(parameter, row) : parameter));
  const cellFunction = cellFunctionOf(definition);
  const [value, upper, lower] = cellFunction.once(ofRow).columns;
  const result = cellAt(value!, 0);
  const told = inputsOf(definition, ofRow);
  const shares = result instanceof CellError ? [] : sharesOf(definition, told, ofRow);
  return {
    definition,
    inputs: told.map((input, index) => ({ ...input, share: shares[index] })),
    result,
    upper: upper ? cellAt(upper, 0) : null,
    lower: lower ? cellAt(lower, 0) : upper ? cellAt(upper, 0) : null,
    unit: typeof result === "number" ? cellFunction.unitOf?.(ofRow) : undefined,
  };
}

/** Whether the call has no answer and this is an input that could not be read. */
export function isUnread({ definition, inputs, result }: CallStory, index: number): boolean {
  const { takes } = definition.inputs[index]!;
  const { reading, assumed } = inputs[index]!;
  const isQuantity = takes === "quantity" || takes === "any quantity";
  return result instanceof CellError && isQuantity && !reading && assumed === undefined;
}

function rowOf(parameter: Argument, row: number): Argument {
  if (!parameter || parameter.block.rows === 1) return parameter;
  const columns = parameter.block.columns.map((column) => sliceColumn(column, row, row + 1));
  return { ...parameter, block: { rows: 1, columns } };
}

type Untold = Omit<ToldInput, "share">;

function inputsOf(definition: Definition, parameters: readonly Argument[]): readonly Untold[] {
  const inputs = definition.inputs as readonly Input[];
  const given = inputs.map((_, index) => parameters[index]?.block);
  const headers = definition.form === "lookup" ? [] : headerCells(parameters[inputs.length]);
  const call = callInputs(definition, given, headers, false);
  // Without a way to share out the headers the cells can still be shown.
  if (call instanceof CellError || "about" in call)
    return inputs.map((input, index) => unread(input, given[index]?.columns[0]));
  return call.inputs.map(told);
}

function unread(input: Input, column: InputColumns["columns"][number] | undefined): Untold {
  const cell = column && column.length > 0 ? cellAt(column, 0) : null;
  const assumed = column ? undefined : fallbackOf(input);
  return { name: input.name, cell, header: undefined, assumed, reading: undefined, base: undefined };
}

function told({ input, columns, headers }: InputColumns): Untold {
  const cells = unread(input, columns[0]);
  const [own = noHeader, ...beside] = headers;
  const header = own.header && { text: own.header.text, address: own.header.address };
  const wanted = input.takes === "quantity" ? input.quantity : undefined;
  const isBlank = cells.cell === null || cells.cell === "";
  if (isBlank && fallbackOf(input) === undefined) return { ...cells, header };
  if (input.takes === "word" || input.takes === "text" || input.takes === "count") return cells;
  const reading = isBlank ? undefined : readCell(input.name, cells.cell, own, wanted);
  if (!reading || reading instanceof CellError || "about" in reading) {
    // A blank stands for a circular orbit only where the fallback is 0; any other blank is an error of the call.
    const assumed = isBlank && input.takes === "quantity" && input.fallback === 0 ? input.fallbackText : cells.assumed;
    return { ...cells, header, assumed };
  }
  const value = toBaseOf(reading.unit, reading.value, reading.digits);
  const sigmas = columns.slice(1).map((column, index) => {
    const sigma = readSigma(input.name, cellAt(column, 0), beside[index] ?? noHeader, reading.unit);
    return sigma instanceof CellError || "about" in sigma
      ? undefined
      : (Math.abs(sigma.value) * baseSlope(sigma.unit, value)) / baseSlope(reading.unit, value);
  });
  const [upper, lower = upper] = reading.upper === undefined ? sigmas : [reading.upper, reading.lower];
  return { ...cells, header, reading: { ...reading, upper, lower }, base: { value, unit: baseText(reading.unit) } };
}

function fallbackOf(input: Input): string | undefined {
  if (input.takes === "quantity") return input.fallbackText;
  if (input.takes === "count") return "1";
  return input.takes === "word" && !input.required ? input.words[0]!.word : undefined;
}

/** How the base unit is written for a reader; a mass is carried as G times the mass. */
function baseText(unit: Unit): string {
  if (unit.kind === "mass") return "m**3/s**2 (GM)";
  if (unit.kind === "instant") return `d from J2000.0, ${unit.frame ?? ""}`;
  return kinds[unit.kind]?.base ?? unit.kind;
}

/**
 * The call again with the uncertainty of one input at a time: inputs are independent, so their squares add up to the
 * square of the whole. Where the sides differ, the squares of both count.
 */
function sharesOf(definition: Definition, inputs: readonly Untold[], parameters: readonly Argument[]) {
  const variances = inputs.map((input, index) => {
    if (input.reading?.upper === undefined) return undefined;
    const alone = inputs.map((other, at) => (at === index || other.reading ? textOf(other, at === index) : undefined));
    const given = parameters.slice(0, inputs.length).map((parameter, at): Argument => {
      const text = alone[at];
      return text === undefined ? parameter : { block: blockOf([[text]]) };
    });
    return varianceOf(definition, [...given, undefined, parameters[inputs.length + 1]]);
  });
  const whole = variances.reduce<number>((sum, variance) => sum + (variance ?? 0), 0);
  return variances.map((variance) => (variance === undefined || whole === 0 ? undefined : variance / whole));
}

function textOf({ reading }: Untold, withUncertainty: boolean): string {
  const { value, upper, lower, unit } = reading!;
  const sigma = withUncertainty ? ` +${upper} -${lower}` : "";
  return `${value}${sigma}${unit.text === one.text ? "" : ` ${symbolOf(unit)}`}`;
}

function varianceOf(definition: Definition, parameters: readonly Argument[]): number | undefined {
  const [, upper, lower] = cellFunctionOf(definition).once(parameters).columns;
  if (!upper) return undefined;
  const sides = [cellAt(upper, 0), cellAt(lower ?? upper, 0)];
  return sides.every((side) => typeof side === "number")
    ? sides.reduce((sum, side) => sum + side * side, 0)
    : undefined;
}
