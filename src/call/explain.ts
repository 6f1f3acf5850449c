import type { Definition, Input } from "../functions/definition.js";
import type { Quantity } from "../functions/quantity.js";
import { kindPhrase } from "../units/kind.js";
import type { UnitProblem } from "../units/problem.js";
import { readHeader } from "../units/readHeader.js";
import type { Unit } from "../units/unit.js";
import type { CallProblem, HeaderCell, UnitPlace } from "./callProblem.js";

/** Some worksheet hosts cut a message here. */
const longest = 250;

/**
 * Every sentence a call can answer with. FUNCTION: input is what came, what that is; what is needed, with a value
 * that works.
 */
export function explain(definition: Definition, problem: CallProblem): string {
  const sentence = `${definition.name}: ${sentenceOf(definition, problem)}`.replace(/\?\.$/, "?");
  return sentence.length <= longest ? sentence : `${sentence.slice(0, longest - 1)}\u2026`;
}

function sentenceOf(definition: Definition, problem: CallProblem): string {
  switch (problem.about) {
    case "too many arguments":
      return `${problem.given} arguments were given and it takes ${problem.most}: ${argumentList(definition)}.`;
    case "missing":
      return `${problem.input} is missing; it needs ${argumentList(definition)}.`;
    case "blank":
      return `${problem.input} is blank; ${remedy(definition, problem.input)}.`;
    case "no unit":
      return `${problem.input} is ${problem.value} with no unit; ${headerRemedy(definition, problem)}.`;
    case "unit":
      return `${problem.input} has ${placeOf(problem.at)}; ${unitSentence(problem.unit)}.`;
    case "wrong kind":
      return `${problem.input} is ${problem.value}${fromHeader(problem.at)}, ${unitPhrase(problem.unit)}; ${kindPhrase(problem.wanted)} is needed, for example ${exampleOf(definition, problem.input)}.`;
    case "disagreement":
      return `${problem.input} is ${quote(problem.text)}, ${kindPhrase(problem.unit.kind)}, but its header ${headerText(problem.header)} says ${problem.headerUnit.text}, ${kindPhrase(problem.headerUnit.kind)}; make the two agree.`;
    case "not a number":
      return `${problem.input} is ${problem.value}, not a number; ${problem.hint ? `write ${problem.hint}` : remedy(definition, problem.input)}.`;
    case "bound":
      return `${problem.input} is ${problem.value}; it must be ${boundPhrase(problem)}, because ${problem.bound.reason}; for example ${exampleOf(definition, problem.input)}.`;
    case "zero or blank":
      return `${problem.input} is 0 or blank; it must be above 0, because ${problem.bound.reason}; for example ${exampleOf(definition, problem.input)}.`;
    case "beyond numbers":
      return `${problem.input} is ${problem.value}, beyond what a number can hold; for example ${exampleOf(definition, problem.input)} works.`;
    case "word":
      return `${problem.input} is ${quote(problem.text)}; it must be one of ${problem.words.join(", ")}${problem.nearest ? `; did you mean ${problem.nearest}?` : "."}`;
    case "lengths":
      return `${problem.input} has ${rowCount(problem.rows)} and ${problem.other} has ${problem.otherRows}; columns of one call need the same number of rows, or one row each.`;
    case "shape":
      return `${problem.input} is ${problem.rows} x ${problem.columns} cells; it takes one column, two with its uncertainty, or three with upper and lower uncertainty.`;
    case "header count":
      return `${problem.given} header cells were given for ${problem.inputs} inputs${problem.columns === problem.inputs ? "" : ` in ${problem.columns} columns`}; give one for each input${problem.columns === problem.inputs ? "" : " or one for each column"}, in their order.`;
    case "no result":
      return `no ${problem.result} follows from ${problem.values}; ${unanswered(definition)}.`;
    case "result unit missing":
      return problem.header === undefined
        ? `the unit of the result is missing; give it last, for example ${definition.name}("1 jupiterMass", , "earthMass").`
        : `the result header ${quote(problem.header)} states no unit; write it in square brackets, for example ${quote(`${problem.header || "Result"} [${defaultUnit(definition)}]`)}.`;
    case "result unit":
      return `the result header is ${quote(problem.header)}; ${unitSentence(problem.unit)}.`;
    case "result kind":
      return resultKindSentence(problem);
    case "several rows":
      return `one row of this column gives ${problem.rows} rows of results; give each input one cell a row.`;
    case "no unit stated":
      return `${quote(problem.text)} states no unit; write it in square brackets, for example "Period [d]", or after a number, "4.23 d".`;
    case "unknown name":
      return `${quote(problem.text)} is not a known constant; ${problem.nearest ? `did you mean "${problem.nearest}"?` : 'for example "c", "G", "au" or "GM_sun" is.'}`;
  }
}

function unitSentence(problem: UnitProblem): string {
  switch (problem.problem) {
    case "unknown unit": {
      const near = problem.nearest;
      const meant =
        near && (near.spelling === near.symbol ? `"${near.symbol}"` : `"${near.spelling}" (${near.symbol})`);
      return `${quote(problem.text)} is not a known unit${meant ? `; did you mean ${meant}?` : '; for example "d", "m/s" or "solMass" is'}`;
    }
    case "ambiguous unit": {
      const choices = problem.choices.map((choice) => `"${choice.symbol}" (${choice.meaning})`);
      return `${quote(problem.text)} has more than one meaning; write ${choices.join(" or ")}`;
    }
    case "unit grammar":
      return `${quote(problem.text)} reads in more than one way; write ${quote(problem.write)}`;
  }
}

function unanswered(definition: Definition): string {
  const reason = definition.form === "number" ? definition.unanswered : undefined;
  return reason ?? "together these values are outside the physics, look at the largest first";
}

function resultKindSentence(problem: Extract<CallProblem, { about: "result kind" }>): string {
  const { header, unit, wanted } = problem;
  const name = readHeader(header).name || header;
  const write =
    unit.text === header
      ? `"${shorten(name)} [${wanted.text}]" or "${wanted.text}"`
      : `"${shorten(name)} [${wanted.text}]"`;
  return `the result is ${unitPhrase(wanted)}, but its header ${quote(header)} asks for ${unit.text}, ${unitPhrase(unit)}; write for example ${write}.`;
}

function headerRemedy(definition: Definition, problem: Extract<CallProblem, { about: "no unit" }>): string {
  const { input, value, header } = problem;
  const unit = quantityOf(definition, input)?.unit ?? "d";
  const typed = `type "${value} ${unit}"`;
  const name = header && !header.isNumber && header.text.trim() ? shorten(header.text.trim()) : capital(input);
  const example = `"${name} [${unit}]"`;
  if (!header) return `give its header (for example ${example}) or ${typed}`;
  if (header.isNumber) {
    return `its header ${header.address ?? ""} is the number ${header.text}; keep the header row in place with $ (B$1:D$1), or ${typed}`;
  }
  return `write the unit in its header ${header.address ? `${header.address} ` : ""}(${example}) or ${typed}`;
}

function placeOf(at: UnitPlace): string {
  return at.place === "header" ? `the header ${headerText(at.header)}` : `the value ${quote(at.text)}`;
}

function fromHeader(at: UnitPlace): string {
  return at.place === "header" ? ` by its header ${headerText(at.header)}` : "";
}

function headerText(header: HeaderCell): string {
  return header.address ? `${header.address} ${quote(header.text)}` : quote(header.text);
}

function unitPhrase(unit: Unit): string {
  return unit.frame ? `${kindPhrase(unit.kind)} in ${unit.frame}` : kindPhrase(unit.kind);
}

function boundPhrase(problem: Extract<CallProblem, { about: "bound" }>): string {
  const { bound, side } = problem;
  const word = side === "lower" ? (bound.open ? "above" : "at least") : bound.open ? "below" : "at most";
  return `${word} ${bound.text}`;
}

function remedy(definition: Definition, input: string): string {
  return input.startsWith("uncertainty")
    ? "type 0 if it is exact"
    : `${kindOfInput(definition, input)} is needed, for example ${exampleOf(definition, input)}`;
}

function kindOfInput(definition: Definition, input: string): string {
  const quantity = quantityOf(definition, input);
  return quantity ? kindPhrase(quantity.kind) : "a quantity";
}

function exampleOf(definition: Definition, input: string): string {
  const quantity = quantityOf(definition, input);
  if (!quantity) return definition.examples[0].cells[0]!;
  return quantity.unit === "1" ? `${quantity.example}` : `${quantity.example} ${quantity.unit}`;
}

function quantityOf(definition: Definition, input: string): Quantity | undefined {
  const name = input.replace(/^uncertainty of /, "");
  const found = (definition.inputs as readonly Input[]).find((candidate) => candidate.name === name);
  return found?.takes === "quantity" ? found.quantity : undefined;
}

function defaultUnit(definition: Definition): string {
  return definition.form === "number" ? definition.result.unit : "km/s";
}

function argumentList(definition: Definition): string {
  const inputs = definition.inputs.map((input) => (isOptional(input) ? `[${input.name}]` : input.name));
  const headers = definition.form === "lookup" ? [] : ["[headers]"];
  const result =
    definition.form === "number" || (definition.form === "lookup" && definition.takesResult)
      ? ["[result]"]
      : definition.form === "conversion"
        ? ["result"]
        : [];
  return [...inputs, ...headers, ...result].join(", ");
}

function isOptional(input: Input): boolean {
  return input.takes === "word" || (input.takes === "quantity" && input.fallback !== undefined);
}

function rowCount(rows: number): string {
  return rows === 1 ? "1 row" : `${rows} rows`;
}

export function quote(text: string): string {
  return `"${shorten(text)}"`;
}

function shorten(text: string): string {
  const line = text.replace(/\s+/g, " ");
  return line.length <= 40 ? line : `${line.slice(0, 39)}\u2026`;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
