import { definitions } from "../functions/definitions.js";
import type { CellFunction } from "./cellFunction.js";
import { cellFunctionOf } from "./cellFunctionOf.js";

const byName = new Map(
  definitions.map((definition) => {
    const cellFunction = cellFunctionOf(definition);
    return [cellFunction.name, cellFunction];
  }),
);

/** Our function of this full name, capitals ignored: "BARY.REFLEX". */
export function findCellFunction(name: string): CellFunction | undefined {
  return byName.get(name.toUpperCase());
}

export const cellFunctionNames: readonly string[] = [...byName.keys()];
