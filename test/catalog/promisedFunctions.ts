import type { FunctionsJson, HostParameter } from "../../src/catalog/functionsJson.js";

/** One line a function: its name and its arguments in order, as worksheets that are saved rely on them. */
export function callLines({ functions }: FunctionsJson): string[] {
  const written = ({ name, optional, repeating }: HostParameter) =>
    repeating ? `${name} ...` : optional ? `[${name}]` : name;
  return functions.map(({ id, parameters }) => `${id}(${parameters.map(written).join(", ")})`);
}

/** What of the promise is broken; a function that is new has to be promised, too. */
export function brokenPromises(promised: readonly string[], lines: readonly string[]): string[] {
  return [
    ...promised.filter((line) => !lines.includes(line)).map((line) => `no longer there: ${line}`),
    ...lines.filter((line) => !promised.includes(line)).map((line) => `not promised yet: ${line}`),
  ];
}
