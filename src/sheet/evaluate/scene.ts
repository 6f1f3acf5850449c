import type { Formula } from "../formula/formula.js";
import type { Node } from "../formula/node.js";
import type { Operand } from "../values/operand.js";
import type { World } from "./world.js";

/** A formula in its column while it is evaluated. */
export interface Scene {
  readonly world: World;
  readonly formula: Formula;
  readonly sheet: number;
  readonly column: number;
  /** What parts that are the same in every row are worth; undefined where their cells still change. */
  readonly known: Map<Node, Operand> | undefined;
}
