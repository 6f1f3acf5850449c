import { CellError } from "../call/cell.js";
import { takesHeaders, takesResult } from "../functions/argumentNames.js";
import type { Definition, Input } from "../functions/definition.js";
import { kindPhrase } from "../units/kind.js";
import { describeInput } from "./describeInput.js";
import { exampleCall } from "./exampleCall.js";
import { signature } from "./signature.js";

/** All there is to say about one function, as lines of plain text; its examples are run. */
export function describeFunction(definition: Definition): string[] {
  return [
    signature(definition),
    "",
    definition.question,
    "",
    "Inputs",
    ...aligned([...(definition.inputs as readonly Input[]).map(inputLine), ...callLines(definition)]),
    "",
    `Result   ${resultText(definition)}`,
    `Formula  ${definition.formula}`,
    `Source   ${definition.source}`,
    ...(definition.note ? [`Note     ${definition.note}`] : []),
    "",
    "Examples",
    ...definition.examples.flatMap((example) => {
      const { formula, value, unit } = exampleCall(definition, example);
      const answer = value instanceof CellError ? value.message : `${value}${unit && unit !== "1" ? ` ${unit}` : ""}`;
      return [`  ${formula}`, `    = ${answer}`, `    check: ${example.gives} (${example.because})`];
    }),
  ];
}

/** What the result is and its unit where none is asked for. */
export function resultText(definition: Definition): string {
  switch (definition.form) {
    case "number": {
      const { quantity, unit, as } = definition.result;
      if (as !== undefined) {
        return `${quantity.meaning}; ${kindPhrase(quantity.kind)}, in the unit of ${as} unless the result header says otherwise`;
      }
      return `${quantity.meaning}; ${kindPhrase(quantity.kind)}${unit === "1" ? "" : `, in ${unit} unless the result header says otherwise`}`;
    }
    case "conversion":
      return "the same quantity, a number in the unit asked for";
    case "text":
      return "a text";
    case "lookup":
      return definition.takesResult ? "a number, in SI units unless the result header says otherwise" : "a text";
  }
}

function inputLine(input: Input): [string, string] {
  return [input.name, describeInput(input)];
}

function callLines(definition: Definition): [string, string][] {
  const lines: [string, string][] = [];
  if (takesHeaders(definition))
    lines.push([
      "headers",
      'the header cells of the inputs, or a text list such as "d; solMass"; they state the units',
    ]);
  if (takesResult(definition))
    lines.push(["result", 'the header cell of the result\'s own column, or a unit such as "km/s"']);
  return lines;
}

function aligned(rows: readonly [string, string][]): string[] {
  const width = Math.max(...rows.map(([name]) => name.length));
  return rows.map(([name, text]) => `  ${name.padEnd(width)}  ${text}`);
}
