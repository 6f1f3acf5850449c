import { argumentNames, isRepeating } from "../functions/argumentNames.js";
import type { Definition, Input, WordInput } from "../functions/definition.js";
import { definitions } from "../functions/definitions.js";
import type { Kind } from "../units/kind.js";
import { resultText } from "./describeFunction.js";
import { describeInput } from "./describeInput.js";
import { usualUnits } from "./usualUnits.js";

/** What a worksheet host reads to offer our functions: their names, arguments and choices. */
export interface FunctionsJson {
  readonly allowCustomDataForDataTypeAny: true;
  readonly allowErrorForDataTypeAny: true;
  readonly functions: readonly HostFunction[];
  readonly enums: readonly HostChoices[];
}

export interface HostFunction {
  readonly id: string;
  readonly name: string;
  readonly description: string;
  readonly helpUrl: string;
  readonly parameters: readonly HostParameter[];
  readonly result: { readonly type: "any"; readonly dimensionality: "matrix" };
  readonly options: { readonly requiresParameterAddresses: true };
}

export interface HostParameter {
  readonly name: string;
  readonly description: string;
  readonly type: "any";
  readonly dimensionality: "matrix";
  readonly optional?: true;
  readonly repeating?: true;
  readonly customEnumId?: string;
}

export interface HostChoices {
  readonly id: string;
  readonly type: "string";
  readonly values: readonly { readonly name: string; readonly stringValue: string; readonly tooltip: string }[];
}

/** The functions as a worksheet host reads them; `helpAddress` is the page that has a paragraph on each. */
export function functionsJson(helpAddress: string): FunctionsJson {
  return {
    allowCustomDataForDataTypeAny: true,
    allowErrorForDataTypeAny: true,
    functions: definitions.map((definition) => hostFunction(definition, helpAddress)),
    enums: choices(),
  };
}

function hostFunction(definition: Definition, helpAddress: string): HostFunction {
  return {
    id: definition.name,
    name: definition.name,
    description: `${definition.question} Gives: ${resultText(definition)}.`,
    helpUrl: `${helpAddress}#${definition.name}`,
    parameters: parameters(definition),
    result: { type: "any", dimensionality: "matrix" },
    options: { requiresParameterAddresses: true },
  };
}

/**
 * A host wants every argument after one that may be left out to be so too; the call says what it misses. Where an input
 * repeats, nothing can follow it: headers and result header are more of the same argument to the host.
 */
function parameters(definition: Definition): HostParameter[] {
  const inputs: readonly Input[] = definition.inputs;
  if (isRepeating(inputs.at(-1))) {
    return inputs.map((input) => ({
      name: input.name.replaceAll(" ", "_"),
      description: `${capital(describeInput(input))}. Then the header cells, then the header cell of the result, where they are given.`,
      type: "any",
      dimensionality: "matrix",
      ...(isRepeating(input) ? { repeating: true } : {}),
    }));
  }
  const names = argumentNames(definition);
  const required = names.findIndex((name) => name.startsWith("["));
  return names.map((written, index): HostParameter => {
    const input: Input | undefined = definition.inputs[index];
    const name = written.replace(/[[\]]/g, "");
    const choiceId =
      input?.takes === "word" ? wordsId(definition, input) : input ? undefined : resultChoices(definition, name);
    return {
      name: name.replaceAll(" ", "_"),
      description: description(definition, input, name),
      type: "any",
      dimensionality: "matrix",
      ...(required >= 0 && index >= required ? { optional: true } : {}),
      ...(choiceId ? { customEnumId: choiceId } : {}),
    };
  });
}

function description(definition: Definition, input: Input | undefined, name: string): string {
  if (!input) {
    return name === "headers"
      ? 'The header cells of the inputs, in their order, or a list such as "d; solMass". They state the units.'
      : `The header cell of the result's own column, or a unit such as "${exampleUnit(definition)}". It states the unit of the result.`;
  }
  const uncertain = input.takes === "quantity" || input.takes === "any quantity";
  const text = capital(describeInput(input));
  return uncertain ? `${text}. A cell or a column; with its uncertainty in the columns beside it.` : `${text}.`;
}

function exampleUnit(definition: Definition): string {
  return definition.form === "number" ? definition.result.unit : "km/s";
}

/** Inputs of one name share their choices, unless these differ between functions. */
function wordsId(definition: Definition, { name, words }: WordInput): string {
  const others = definitions.flatMap(({ inputs }) => inputs as readonly Input[]);
  const differ = others.some((other) => other.takes === "word" && other.name === name && other.words !== words);
  return differ ? `BARY.${definition.name}.${name}` : `BARY.${name}`;
}

function unitsId(kind: Kind | undefined): string {
  return kind === undefined ? "BARY.units" : `BARY.units.${kind.replaceAll(" ", "_")}`;
}

function resultChoices(definition: Definition, name: string): string | undefined {
  if (name !== "result") return undefined;
  return unitsId(definition.form === "number" ? definition.result.quantity.kind : undefined);
}

/** The words of every input that takes one, the units of every kind of result, and all of these units together. */
function choices(): HostChoices[] {
  const words = new Map<string, HostChoices>();
  const kinds = new Set<Kind>();
  for (const definition of definitions) {
    for (const input of definition.inputs as readonly Input[]) {
      if (input.takes !== "word") continue;
      const id = wordsId(definition, input);
      words.set(
        id,
        hostChoices(
          id,
          input.words.map(({ word, meaning }) => ({ text: word, meaning })),
        ),
      );
    }
    if (definition.form === "number") kinds.add(definition.result.quantity.kind);
  }
  const units = [...kinds].map((kind) => hostChoices(unitsId(kind), usualUnits(kind)));
  return [...words.values(), ...units, hostChoices(unitsId(undefined), [...kinds].flatMap(usualUnits))];
}

function hostChoices(id: string, values: readonly { readonly text: string; readonly meaning: string }[]): HostChoices {
  return {
    id,
    type: "string",
    values: values.map(({ text, meaning }) => ({ name: text, stringValue: text, tooltip: meaning })),
  };
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
