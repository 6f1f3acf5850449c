import { namespace } from "../../../../call/cellFunctionOf.js";
import { resultText } from "../../../../catalog/describeFunction.js";
import { describeInput } from "../../../../catalog/describeInput.js";
import { searchFunctions as searchOwn } from "../../../../catalog/searchFunctions.js";
import { isOptional, takesHeaders, takesResult } from "../../../../functions/argumentNames.js";
import type { Definition, Input } from "../../../../functions/definition.js";
import { definitions } from "../../../../functions/definitions.js";
import { families } from "../../../../sheet/worksheetFunctions/findWorksheetFunction.js";
import type { WorksheetFunction } from "../../../../sheet/worksheetFunctions/worksheetFunction.js";
import type { FunctionEntry } from "../../protocol/answers.js";

type ParameterEntry = FunctionEntry["parameters"][number];

/** All functions a formula can call, ours first. */
export const functionEntries: readonly FunctionEntry[] = [
  ...definitions.map(ownEntry),
  ...families.flatMap(({ heading, functions }) =>
    functions.map((each) => worksheetEntry(each, heading)).sort((a, b) => (a.name < b.name ? -1 : 1)),
  ),
];

/** Names of the functions that answer a question: ours by their meaning, the others by their name or family. */
export function searchFunctions(words: string): readonly string[] {
  const own = searchOwn(words).map(({ name }) => `${namespace}.${name}`);
  const wanted = words.trim().toUpperCase();
  if (wanted === "") return functionEntries.map(({ name }) => name);
  const others = functionEntries.filter(({ own: isOwn }) => !isOwn);
  const named = others.filter(({ name }) => name.startsWith(wanted));
  const within = others.filter(
    ({ name, question }) =>
      !name.startsWith(wanted) && (name.includes(wanted) || question.toUpperCase().includes(wanted)),
  );
  const ours = functionEntries.filter(({ own: isOwn, name }) => isOwn && name.includes(wanted) && !own.includes(name));
  const exact = others.filter(({ name }) => name === wanted);
  const found = [
    ...exact.map(({ name }) => name),
    ...ours.map(({ name }) => name),
    ...own,
    ...[...named, ...within].map(({ name }) => name),
  ];
  return [...new Set(found)];
}

function ownEntry(definition: Definition): FunctionEntry {
  const parameters = (definition.inputs as readonly Input[]).map(inputEntry);
  const plain = { optional: true, repeating: false, unit: "" };
  if (takesHeaders(definition)) {
    parameters.push({ ...plain, name: "headers", meaning: "the header cells of the inputs, which state the units" });
  }
  if (takesResult(definition)) {
    const optional = definition.form !== "conversion";
    const meaning = "the header cell of the result's own column, or a unit";
    parameters.push({ ...plain, optional, name: "result", meaning });
  }
  const { name, question } = definition;
  return { name: `${namespace}.${name}`, question, own: true, parameters, result: resultText(definition) };
}

function inputEntry(input: Input): ParameterEntry {
  const unit = input.takes === "quantity" && input.quantity.unit !== "1" ? input.quantity.unit : "";
  const repeating = input.takes === "quantity" && input.repeats === true;
  return { name: input.name, optional: isOptional(input), repeating, meaning: describeInput(input), unit };
}

function worksheetEntry(
  { name, parameterNames, leastArguments, mostArguments }: WorksheetFunction,
  heading: string,
): FunctionEntry {
  const named = parameterNames ?? numbered(leastArguments, mostArguments);
  const parameters = named.map((each) => ({ ...each, meaning: "", unit: "" }));
  return { name, question: heading, own: false, parameters, result: "" };
}

function numbered(least: number, most: number) {
  const count = Number.isFinite(most) ? most : Math.max(1, least);
  return Array.from({ length: count }, (_, index) => ({
    name: `value ${index + 1}`,
    optional: index >= least,
    repeating: !Number.isFinite(most) && index === count - 1,
  }));
}
