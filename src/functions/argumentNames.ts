import type { Definition, Input } from "./definition.js";

export function isOptional(input: Input): boolean {
  switch (input.takes) {
    case "word":
      return !input.required;
    case "quantity":
      return input.fallback !== undefined;
    case "count":
      return true;
    default:
      return false;
  }
}

export function isRepeating(input: Input | undefined): boolean {
  return input?.takes === "quantity" && input.repeats === true;
}

export function takesHeaders(definition: Definition): boolean {
  return definition.form !== "lookup";
}

export function takesResult(definition: Definition): boolean {
  return definition.form === "lookup" ? definition.takesResult : definition.form !== "text";
}

/** The arguments of a call in their order; what may be left out stands in square brackets. */
export function argumentNames(definition: Definition): readonly string[] {
  const inputs = (definition.inputs as readonly Input[]).flatMap((input) => {
    const name = isOptional(input) ? `[${input.name}]` : input.name;
    return isRepeating(input) ? [name, `[${input.name} ...]`] : [name];
  });
  const headers = takesHeaders(definition) ? ["[headers]"] : [];
  const result = takesResult(definition) ? [definition.form === "conversion" ? "result" : "[result]"] : [];
  return [...inputs, ...headers, ...result];
}
