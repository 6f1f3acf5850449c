import { argumentNames } from "../functions/argumentNames.js";
import type { Definition, Input } from "../functions/definition.js";
import type { Quantity } from "../functions/quantity.js";
import { kindPhrase } from "../units/kind.js";
import type { UnitProblem } from "../units/problem.js";
import { readHeader } from "../units/readHeader.js";
import { toBase, type Unit } from "../units/unit.js";
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
      return `${problem.given} arguments were given, and it takes at most ${problem.most}: ${argumentList(definition)}.`;
    case "missing":
      return `${problem.input} is missing; the arguments are ${argumentList(definition)}.`;
    case "blank":
      return `${problem.input} is blank; ${remedy(definition, problem.input)}.`;
    case "no unit":
      return `${problem.input} is ${problem.value} with no unit; ${headerRemedy(definition, problem)}.`;
    case "unit":
      return `${problem.input} ${placeOf(problem.at)}; ${unitSentence(problem.unit, quantityOf(definition, problem.input)?.unit)}.`;
    case "wrong kind":
      return `${problem.input} is ${problem.value}${fromHeader(problem.at)}, ${unitPhrase(problem.unit)}; ${kindPhrase(problem.wanted)} is needed, for example ${kindRemedy(definition, problem)}.`;
    case "disagreement":
      return `${problem.input} is ${quote(problem.text)}, ${kindPhrase(problem.unit.kind)}, but its header ${headerText(problem.header)} says ${problem.headerUnit.text}, ${kindPhrase(problem.headerUnit.kind)}; make the two agree, for example with the header ${headerWith(problem.header.text, problem.unit.text)}.`;
    case "not a number":
      return `${problem.input} is ${problem.value}, not a number; ${problem.hint ? `write ${problem.hint}` : remedy(definition, problem.input)}.`;
    case "bound":
      return `${problem.input} is ${problem.value}; it must be ${boundPhrase(problem)}, because ${problem.bound.reason}; for example ${exampleOf(definition, problem.input)}.`;
    case "zero or blank":
      return `${problem.input} is 0 or blank; it must be above 0, because ${problem.bound.reason}; for example ${exampleOf(definition, problem.input)}.`;
    case "zero for blank":
      return `${problem.input} is 0 or blank; ${kindOfInput(definition, problem.input)} is needed, for example ${exampleOf(definition, problem.input)}; for a true 0 type "0 ${problem.unit.text}".`;
    case "beyond numbers":
      return problem.asked
        ? `${problem.input} is ${problem.value}, which no number can hold in ${problem.asked.text}; ask for another unit.`
        : `${problem.input} is ${problem.value}, beyond what a number can hold; for example ${exampleOf(definition, problem.input)} works.`;
    case "uncertainty beyond numbers":
      return `the uncertainty of ${problem.result} is beyond what a number can hold; look for a slip in the uncertainties of its inputs.`;
    case "word":
      return `${problem.input} is ${quote(problem.text)}; it must be ${anyOf(problem.words.map((word) => `"${word}"`))}${problem.nearest ? `; did you mean "${problem.nearest}"?` : "."}`;
    case "lengths":
      return `${problem.input} has ${rowCount(problem.rows)} and ${problem.other} has ${problem.otherRows}; columns of one call need the same number of rows, or one row each.`;
    case "shape":
      return `${problem.input} is ${problem.rows} x ${problem.columns} cells; it takes ${isCount(definition, problem.input) ? "one cell" : "one column"}${columnsRemedy(definition, problem.input)}.`;
    case "header of another column":
      return `${problem.input} was given the header ${headerText(problem.header)}, but its own column is headed ${headerText(problem.own)}; give inputs and headers in the same order.`;
    case "header count":
      return headerCountSentence(problem);
    case "no result":
      return `no ${problem.result} follows from ${problem.values}; ${unanswered(definition)}.`;
    case "result unit missing":
      return problem.header === undefined
        ? `the unit of the result is missing; give it last, for example ${definition.name}("1 jupiterMass", , "earthMass").`
        : resultHeaderSentence(definition, problem.header);
    case "result unit":
      return `the result header is ${quote(problem.header)}; ${unitSentence(problem.unit, defaultUnit(definition))}.`;
    case "result kind":
      return resultKindSentence(problem);
    case "several rows":
      return `one row of this column gives ${problem.rows} rows of results; give each input one cell a row.`;
    case "count":
      return `${problem.input} is ${problem.value}; it must be a whole number from 1 to ${problem.most}, for example 5.`;
    case "count of columns":
      return `${problem.input} is ${problem.count} for a column of ${rowCount(problem.rows)}; a column has one result in each row, so leave ${problem.input} out, or give each input one cell.`;
    case "needed":
      return `${problem.input} is 0 or missing, but ${problem.by} is not 0; ${problem.because}, for example ${exampleOf(definition, problem.input)}${zeroRemedy(definition, problem.input)}.`;
    case "two frames":
      return `${problem.input} is in ${problem.frame} and ${problem.other} in ${problem.otherFrame}; times of two scales do not mix: bring both into one${byBarytime(problem)}.`;
    case "no clock":
      return `${problem.input} is in ${problem.frame}; the clock of the site is needed, ${problem.wanted} (JD_TAI, JD_TT and JD_TDB are converted), for example ${exampleOf(definition, problem.input)}.`;
    case "zero of date":
      return `${problem.input} is ${problem.value}, ${Math.abs(yearOf(problem)) > 1e4 ? "far outside history" : `the year ${yearOf(problem)}`}; it looks like ${problem.meant}: ${problem.header ? `write the header ${headerWith(problem.header.text, problem.meant)}` : `write ${problem.meant} after it`}.`;
    case "hours or degrees":
      return `${problem.input} is ${quote(problem.text)}, ${problem.headerUnit.text === "hourangle" ? "degrees" : "hours"}, but its header ${headerText(problem.header)} says ${problem.headerUnit.text}; ${problem.headerUnit.text === "hourangle" ? `write the header ${headerWith(problem.header.text, "deg")}` : `write the header ${headerWith(problem.header.text, "h")}`}, or letters: 12h30m00s, 12d30m00s.`;
    case "no unit stated":
      return `${quote(problem.text)} states no unit; write it in square brackets, for example "Period [d]", or after a number, "4.23 d".`;
    case "unknown name":
      return `${quote(problem.text)} is not a known constant; ${problem.nearest ? `did you mean "${problem.nearest}"?` : 'for example "c", "G", "au" or "GM_sun" is.'}`;
  }
}

/** `wanted` is a unit that would do, where one is known. */
export function unitSentence(problem: UnitProblem, wanted?: string): string {
  switch (problem.problem) {
    case "unknown unit": {
      const near = problem.nearest;
      const meant =
        near && (near.spelling === near.symbol ? `"${near.symbol}"` : `"${near.spelling}" (${near.symbol})`);
      return `${quote(problem.text)} is not a known unit${meant ? `; did you mean ${meant}?` : `; for example ${knownUnits(wanted)} is`}`;
    }
    case "ambiguous unit": {
      const choices = problem.choices.map((choice) => `"${choice.symbol}" (${choice.meaning})`);
      return `${quote(problem.text)} has more than one meaning; write ${anyOf(choices)}`;
    }
    case "unit grammar":
      return `${quote(problem.text)} reads in more than one way; write ${quote(problem.write)}`;
  }
}

function knownUnits(wanted: string | undefined): string {
  return wanted === undefined || wanted === "1" ? '"d", "m/s" or "solMass"' : `"${wanted}"`;
}

function unanswered(definition: Definition): string {
  const reason = definition.form === "number" ? definition.unanswered : undefined;
  return reason ?? "together these values are outside the physics, look for one that is far too large or too small";
}

function resultKindSentence(problem: Extract<CallProblem, { about: "result kind" }>): string {
  const { header, unit, wanted } = problem;
  return `the result is ${unitPhrase(wanted)}, but its header ${quote(header)} asks for ${unit.text}, ${unitPhrase(unit)}; write for example ${headerWith(header, wanted.text)}.`;
}

function headerCountSentence(problem: Extract<CallProblem, { about: "header count" }>): string {
  const { given, inputs, columns } = problem;
  const came = given === 1 ? "1 header cell was" : `${given} header cells were`;
  const wanted = inputs === 1 ? "1 input" : `${inputs} inputs`;
  return columns === inputs
    ? `${came} given for ${wanted}; give one for each input, in their order.`
    : `${came} given for ${wanted} in ${columns} columns; give one for each input or one for each column, in their order.`;
}

function resultHeaderSentence(definition: Definition, header: HeaderCell): string {
  const unit = defaultUnit(definition);
  if (header.isNumber) {
    const place = header.address ? ` ${header.address}` : "";
    return `the result header${place} is the number ${header.text}; keep the header row in place with $ (G$1), or type the unit there, for example "${unit ?? "km/s"}".`;
  }
  const text = header.text.trim();
  const came = text === "" ? "the result header is blank" : `the result header ${quote(text)} states no unit`;
  return unit === undefined
    ? `${came}; write a unit, for example "km/s", or a header with its unit in square brackets, for example "Period [d]".`
    : `${came}; write the unit in square brackets, for example "${text === "" ? "Result" : shorten(text)} [${unit}]".`;
}

/** A header rewritten with another unit. One that is a unit as a whole may be a column's short name: "K" is kelvin, too. */
function headerWith(header: string, unit: string): string {
  const name = readHeader(header).name || (header.trim().length <= 2 ? header.trim() : "");
  return name === "" ? `"${unit}"` : `"${shorten(name)} [${unit}]"`;
}

function kindRemedy(definition: Definition, problem: Extract<CallProblem, { about: "wrong kind" }>): string {
  const unit = quantityOf(definition, problem.input)?.unit;
  return problem.at.place === "header" && unit
    ? `with the header ${headerWith(problem.at.header.text, unit)}`
    : exampleOf(definition, problem.input);
}

function anyOf(choices: readonly string[]): string {
  return choices.length === 1 ? choices[0]! : `${choices.slice(0, -1).join(", ")} or ${choices.at(-1)}`;
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
  return at.place === "header" ? `has the header ${headerText(at.header)}` : `is ${quote(at.text)}`;
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

/** A blank may arrive as the number 0, so a 0 that is meant says its unit. */
function zeroRemedy(definition: Definition, input: string): string {
  const quantity = quantityOf(definition, input);
  const allowed = quantity && (quantity.lower === undefined || quantity.lower.at < 0);
  return allowed ? `; for a true 0 type "0 ${quantity.unit}"` : "";
}

function byBarytime({ frame, otherFrame }: Extract<CallProblem, { about: "two frames" }>): string {
  const frames = [frame, otherFrame];
  return frames.includes("JD_UTC") && frames.includes("BJD_TDB") ? "; BARYTIME turns JD_UTC into BJD_TDB" : "";
}

function yearOf({ value, unit }: Extract<CallProblem, { about: "zero of date" }>): number {
  return Math.floor(2000 + toBase(unit, Number.parseFloat(value)) / 365.2425);
}

function remedy(definition: Definition, input: string): string {
  return input.startsWith("uncertainty")
    ? "type 0 if it is exact"
    : `${kindOfInput(definition, input)} is needed, for example ${exampleOf(definition, input)}`;
}

function kindOfInput(definition: Definition, input: string): string {
  const quantity = quantityOf(definition, input);
  const words = wordsOf(definition, input);
  if (words) return "one of its words";
  return quantity ? kindPhrase(quantity.kind) : takesQuantity(definition) ? "a quantity" : "a text";
}

function exampleOf(definition: Definition, input: string): string {
  const quantity = quantityOf(definition, input);
  const words = wordsOf(definition, input);
  if (words) return anyOf(words.map((word) => `"${word}"`));
  if (!quantity) return quote(definition.examples[0].cells[0]!);
  return quantity.unit === "1" ? `${quantity.example}` : `${quantity.example} ${quantity.unit}`;
}

function inputNamed(definition: Definition, input: string): Input | undefined {
  const name = input.replace(/^uncertainty of /, "");
  return (definition.inputs as readonly Input[]).find((candidate) => candidate.name === name);
}

function quantityOf(definition: Definition, input: string): Quantity | undefined {
  const found = inputNamed(definition, input);
  return found?.takes === "quantity" ? found.quantity : undefined;
}

function wordsOf(definition: Definition, input: string): readonly string[] | undefined {
  const found = (definition.inputs as readonly Input[]).find(({ name }) => name === input);
  return found?.takes === "word" ? found.words.map(({ word }) => word) : undefined;
}

function isCount(definition: Definition, input: string): boolean {
  return (definition.inputs as readonly Input[]).some(({ name, takes }) => name === input && takes === "count");
}

function defaultUnit(definition: Definition): string | undefined {
  return definition.form === "number" ? definition.result.unit : undefined;
}

function argumentList(definition: Definition): string {
  return argumentNames(definition).join(", ");
}

function columnsRemedy(definition: Definition, input: string): string {
  const found = inputNamed(definition, input);
  if (found?.takes === "quantity" && found.alone) return "; give each as an argument of its own: B2, C2, D2";
  const mayHaveUncertainty = found?.takes === "quantity" || takesQuantity(definition);
  return mayHaveUncertainty ? ", two with its uncertainty, or three with upper and lower uncertainty" : "";
}

/** Whether its one input is a quantity of any kind, not a text. */
function takesQuantity(definition: Definition): boolean {
  return definition.form === "conversion" || definition.form === "text";
}

function rowCount(rows: number): string {
  return rows === 1 ? "1 row" : `${rows} rows`;
}

export function quote(text: string): string {
  return `"${shorten(text)}"`;
}

export function shorten(text: string): string {
  const line = text.replace(/\s+/g, " ");
  return line.length <= 40 ? line : `${line.slice(0, 39)}\u2026`;
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
