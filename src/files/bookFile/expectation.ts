import { FileProblem } from "../fileProblem.js";

/** A part of a parsed file and where it stands in it: `sheets[0].name`. */
export interface Part {
  readonly value: unknown;
  readonly path: string;
}

/** That a part is not what the format says; `needed` reads on after "is needed". */
export function unlike({ value, path }: Part, needed: string): FileProblem {
  const shown = value === undefined ? "missing" : (JSON.stringify(value) ?? "missing");
  const quoted = shown.length > 60 ? `${shown.slice(0, 57)}...` : shown;
  return new FileProblem(
    "not-as-standard",
    `The book file is damaged or was changed by hand: ${path.slice(0, 60)} is ${quoted}; ${needed} is needed.`,
  );
}

export function member({ value, path }: Part, name: string): Part {
  const holder = value as Record<string, unknown>;
  return {
    value: Object.hasOwn(holder, name) ? holder[name] : undefined,
    path: path === "" ? name : `${path}.${name}`,
  };
}

export function anObject(part: Part): Part {
  if (typeof part.value !== "object" || part.value === null || Array.isArray(part.value)) {
    throw unlike(part, "an object");
  }
  return part;
}

export function list(part: Part, most: number): Part[] {
  if (!Array.isArray(part.value)) throw unlike(part, "a list");
  if (part.value.length > most) throw unlike({ ...part, value: part.value.length }, `a list of at most ${most}`);
  return part.value.map((value, index) => ({ value, path: `${part.path}[${index}]` }));
}

export function text(part: Part, longest: number): string {
  if (typeof part.value !== "string" || part.value.length > longest) {
    throw unlike(part, `a text of at most ${longest} characters`);
  }
  return part.value;
}

export function wholeNumber(part: Part, least: number, most: number): number {
  const { value } = part;
  if (typeof value !== "number" || !Number.isInteger(value) || value < least || value > most) {
    throw unlike(part, `a whole number from ${least} to ${most}`);
  }
  return value;
}

/** What `read` makes of a part that may be left out. */
export function ifThere<T>(part: Part, read: (part: Part) => T): T | undefined {
  return part.value === undefined ? undefined : read(part);
}

export function oneOf<T extends string | number | boolean>(part: Part, choices: readonly T[]): T {
  if (!choices.includes(part.value as T))
    throw unlike(part, choices.map((choice) => JSON.stringify(choice)).join(" or "));
  return part.value as T;
}
