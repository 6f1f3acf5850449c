import type { FunctionsJson } from "../../src/catalog/functionsJson.js";

/**
 * What a worksheet host would refuse: limits and rules of the host's documentation of custom-functions metadata
 * (learn.microsoft.com, "Manually create JSON metadata for custom functions").
 */
export function functionsJsonProblems({ functions, enums }: FunctionsJson): string[] {
  const enumIds = enums.map(({ id }) => id);
  return [
    ...twice(functions.map(({ id }) => id.toUpperCase())).map((id) => `two functions ${id}`),
    ...twice(enumIds).map((id) => `two enums ${id}`),
    ...functions.flatMap(({ id, name, description, helpUrl, parameters }) => {
      const flags = parameters.map(({ optional }) => optional === true);
      const about = (problem: string) => `${id}: ${problem}`;
      return [
        ...(/^[A-Z][A-Z0-9]{2,63}$/.test(id) ? [] : [about("id is not 3 to 64 capital letters and digits")]),
        ...(/^([A-Z]{1,3}\d+|R\d*C\d*|R|C)$/.test(id) ? [about("id is a cell address")] : []),
        ...(name === id ? [] : [about("name is not its id")]),
        ...(description.length <= 1024 && description ? [] : [about("description is not 1 to 1024 characters")]),
        ...(/^https:\/\//.test(helpUrl) ? [] : [about("help is not at an https address")]),
        ...(parameters.length <= 128 ? [] : [about("more than 128 arguments")]),
        ...(flags.lastIndexOf(false) < flags.indexOf(true) || !flags.includes(true)
          ? []
          : [about("an argument that is needed follows one that may be left out")]),
        ...(parameters.slice(0, -1).some(({ repeating }) => repeating)
          ? [about("an argument that repeats is not the last")]
          : []),
        ...twice(parameters.map((parameter) => parameter.name)).map((double) => about(`two arguments ${double}`)),
        ...parameters.flatMap((parameter) => [
          ...(/^[A-Za-z]\w{0,63}$/.test(parameter.name) ? [] : [about(`argument ${parameter.name} is no name`)]),
          ...(parameter.description && parameter.description.length <= 512
            ? []
            : [about(`description of ${parameter.name} is not 1 to 512 characters`)]),
          ...(parameter.customEnumId === undefined || enumIds.includes(parameter.customEnumId)
            ? []
            : [about(`no enum ${parameter.customEnumId}`)]),
        ]),
      ];
    }),
    ...enums.flatMap(({ id, values }) =>
      twice(values.map(({ name }) => name)).map((name) => `${id}: two values ${name}`),
    ),
  ];
}

function twice(names: readonly string[]): string[] {
  return names.filter((name, index) => names.indexOf(name) < index);
}
