import type { Cell } from "../call/cell.js";
import type { Argument } from "../call/cellFunction.js";
import { cellFunctionOf, namespace } from "../call/cellFunctionOf.js";
import { blockOf, cellAt } from "../call/column.js";
import { takesHeaders } from "../functions/argumentNames.js";
import type { Definition, Example } from "../functions/definition.js";

/** An example as a formula, and what the door answers to it. */
export interface ExampleCall {
  readonly formula: string;
  readonly value: Cell;
  readonly unit: string | undefined;
}

export function exampleCall(definition: Definition, example: Example): ExampleCall {
  const texts = argumentTexts(definition, example);
  const parameters = texts.map((text): Argument => (text === "" ? undefined : { block: blockOf([[cellOf(text)]]) }));
  const called = cellFunctionOf(definition);
  const written = texts.map((text) => (text === "" || typeof cellOf(text) === "number" ? text : `"${text}"`));
  return {
    formula: `=${namespace}.${definition.name}(${written.join(", ").replace(/, (?=,)/g, ",")})`,
    value: cellAt(called.once(parameters).columns[0]!, 0),
    unit: called.unitOf?.(parameters),
  };
}

/** The arguments in their places; empty where one is left out before the result's unit. */
function argumentTexts(definition: Definition, { cells, result }: Example): readonly string[] {
  if (result === undefined) return cells;
  const places = Math.max(definition.inputs.length, cells.length) + (takesHeaders(definition) ? 1 : 0);
  return [...cells, ...new Array<string>(places - cells.length).fill(""), result];
}

function cellOf(text: string): number | string {
  return text.trim() !== "" && Number.isFinite(Number(text)) ? Number(text) : text;
}
