import { namespace } from "../call/cellFunctionOf.js";
import { argumentNames } from "../functions/argumentNames.js";
import type { Definition } from "../functions/definition.js";

/** `BARY.AXIS(period, star mass, [planet mass], [headers], [result])`. */
export function signature(definition: Definition): string {
  return `${namespace}.${definition.name}(${argumentNames(definition).join(", ")})`;
}
