import { definitions } from "../../functions/definitions.js";
import { hostFunctionOf } from "./hostFunctionOf.js";

/** Hands every function to the host, under the name that functions.json gives it. */
export function register(host: typeof CustomFunctions): void {
  for (const definition of definitions) host.associate(definition.name, hostFunctionOf(definition));
}
