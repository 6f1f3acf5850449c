import { isRepeating } from "../functions/argumentNames.js";
import type { Definition, Input, NumberDefinition, QuantityInput } from "../functions/definition.js";
import { isProblem } from "../units/problem.js";
import { readHeader } from "../units/readHeader.js";
import { readQuantity } from "../units/readQuantity.js";
import type { Cell } from "./cell.js";
import type { Argument, RowArgument } from "./cellFunction.js";
import { type Column, cellAt } from "./column.js";

/** One call of a definition: its own number of inputs, then headers and result header in the places after them. */
export interface OrderedCall<Parameter> {
  readonly definition: Definition;
  readonly parameters: readonly Parameter[];
}

/**
 * Puts the arguments of a function whose last input repeats in order: as many inputs as were given, headers and result
 * behind them. No place tells where the inputs end, so what the arguments are does: at the end, texts that state units
 * and no numbers are the headers, and a second such argument, also after one that was left out, is the result's.
 */
export function orderedCall<Parameter extends Argument | RowArgument>(
  definition: Definition,
  parameters: readonly Parameter[],
): OrderedCall<Parameter> {
  if (definition.form !== "number" || !isRepeating(definition.inputs.at(-1))) return { definition, parameters };
  const end = parameters.findLastIndex((parameter) => !isLeftOut(parameter)) + 1;
  const given = parameters.slice(0, end);
  const [before, last] = [given.at(-2), given.at(-1)];
  const hasTail = end > definition.inputs.length && statesUnits(last);
  const hasBoth = hasTail && end > definition.inputs.length + 1 && (isLeftOut(before) || statesUnits(before));
  const terms = given.slice(0, end - (hasBoth ? 2 : hasTail ? 1 : 0));
  const tail = given.slice(terms.length);
  return { definition: withTerms(definition, terms.length), parameters: [...terms, ...tail] };
}

/** Whether some row of a column that is filled down could be a header, so that each row has to be looked at by itself. */
export function mayStateUnits(columns: readonly Column[]): boolean {
  return columns.some((column) => column.others?.some((cell) => cell !== undefined && isUnitText(cell)));
}

function withTerms(definition: NumberDefinition, count: number): NumberDefinition {
  const before = definition.inputs.slice(0, -1);
  const term = definition.inputs.at(-1) as QuantityInput;
  const more = Math.max(count, definition.inputs.length) - before.length - 1;
  if (more === 0) return definition;
  const { repeats: _, ...first } = term;
  const others = Array.from({ length: more }, (_, index): Input => ({ ...first, name: `${term.name} ${index + 2}` }));
  return { ...definition, inputs: [...before, first, ...others] as NumberDefinition["inputs"] };
}

function isLeftOut(parameter: Argument | RowArgument): boolean {
  return parameter === undefined || ("fixed" in parameter && parameter.fixed === undefined);
}

/** Texts and blanks alone, one of which states a unit. */
function statesUnits(parameter: Argument | RowArgument): boolean {
  if (parameter === undefined || "perRow" in parameter) return false;
  const cells = "fixed" in parameter ? parameter.fixed : parameter;
  if (!cells) return false;
  let stated = false;
  for (const column of cells.block.columns) {
    for (let row = 0; row < column.length; row++) {
      const cell = cellAt(column, row);
      if (cell === null || cell === "") continue;
      if (typeof cell !== "string" || isQuantityText(cell)) return false;
      stated ||= isUnitText(cell);
    }
  }
  return stated;
}

function isUnitText(cell: Cell): boolean {
  if (typeof cell !== "string" || isQuantityText(cell)) return false;
  return cell.split(";").some((part) => {
    const { unit, problem } = readHeader(part);
    return unit !== undefined || problem !== undefined;
  });
}

function isQuantityText(text: string): boolean {
  return /^\s*[-+(\u2212.\d]/.test(text) && !isProblem(readQuantity(text));
}
