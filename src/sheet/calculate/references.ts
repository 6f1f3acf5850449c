import type { World } from "../evaluate/world.js";
import type { Formula } from "../formula/formula.js";
import type { Reference } from "../formula/reference.js";

/** The references of a formula, those behind defined names included. */
export function referencesOf(world: World, formula: Formula): Reference[] {
  const named = formula.names.flatMap((name) => world.definedName(name)?.references ?? []);
  return [...formula.references, ...named].filter((each) => each !== undefined);
}
