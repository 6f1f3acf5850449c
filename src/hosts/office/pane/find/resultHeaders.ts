import type { Definition } from "../../../../functions/definition.js";

/** Headers for the column of a result and the columns of its uncertainties, each with the unit. */
export function resultHeaders(definition: Definition, unit: string | undefined, columns: number): readonly string[] {
  const name =
    definition.form === "number" ? capital(definition.result.quantity.name) : capital(definition.name.toLowerCase());
  const uncertainties = [[], [" uncertainty"], [" upper uncertainty", " lower uncertainty"]][columns - 1] ?? [];
  const stated = unit === undefined || unit === "1" ? "" : ` [${unit}]`;
  return ["", ...uncertainties].map((suffix) => `${name}${suffix}${stated}`);
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
