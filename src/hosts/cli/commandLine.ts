import { nearest } from "../../units/nearest.js";
import { UsageProblem } from "./usageProblem.js";

/** How many values follow each option of a command. */
export type OptionShapes = Readonly<Record<string, number>>;

export interface CommandLine {
  readonly operands: readonly string[];
  /** The values of each time an option was given, in order. */
  readonly options: ReadonlyMap<string, readonly (readonly string[])[]>;
}

/** Splits the words after a command's name into operands and options; `--` ends the options. */
export function readCommandLine(words: readonly string[], shapes: OptionShapes): CommandLine {
  const operands: string[] = [];
  const options = new Map<string, string[][]>();
  for (let index = 0; index < words.length; index++) {
    const word = words[index]!;
    if (word === "--") {
      operands.push(...words.slice(index + 1));
      break;
    }
    if (!/^--?[a-z]/.test(word)) {
      operands.push(word);
      continue;
    }
    const [name, attached] = splitOption(word);
    const count = shapes[name];
    if (count === undefined) throw unknownOption(name, Object.keys(shapes));
    const values = attached === undefined ? words.slice(index + 1, index + 1 + count) : [attached];
    const next = values.findIndex((value) => shapes[value] !== undefined);
    if (next >= 0) throw new UsageProblem(`${name} takes ${valuesText(count)}, ${next} given before ${values[next]}.`);
    if (values.length !== count) throw new UsageProblem(`${name} takes ${valuesText(count)}, ${values.length} given.`);
    if (attached === undefined) index += count;
    options.set(name, [...(options.get(name) ?? []), values]);
  }
  return { operands, options };
}

/** The value of an option that is given once at most. */
export function optionValue(line: CommandLine, name: string): string | undefined {
  const given = line.options.get(name);
  if (given && given.length > 1) throw new UsageProblem(`${name} was given ${given.length} times; give it once.`);
  return given?.[0]?.[0];
}

function splitOption(word: string): [string, string | undefined] {
  const equals = word.indexOf("=");
  return equals < 0 ? [word, undefined] : [word.slice(0, equals), word.slice(equals + 1)];
}

function unknownOption(name: string, known: readonly string[]): UsageProblem {
  const near = nearest(name, known);
  return new UsageProblem(
    `there is no option ${name}; ${near ? `did you mean ${near}?` : `it takes ${known.join(", ") || "none"}.`}`,
  );
}

function valuesText(count: number): string {
  return count === 0 ? "no value" : count === 1 ? "one value" : `${count} values`;
}
