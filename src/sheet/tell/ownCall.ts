import type { Argument } from "../../call/cellFunction.js";
import { namespace } from "../../call/cellFunctionOf.js";
import type { Definition } from "../../functions/definition.js";
import { definitions } from "../../functions/definitions.js";
import { argumentOf, evaluateCell } from "../evaluate/evaluateCell.js";
import type { Scene } from "../evaluate/scene.js";
import type { Node } from "../formula/node.js";

export type OwnNode = Extract<Node, { kind: "own" }>;

/** The first call of one of our functions in a formula, from the outside in; undefined where there is none. */
export function ownCallIn(node: Node): OwnNode | undefined {
  if (node.kind === "own") return node;
  for (const part of partsOf(node)) {
    const found = part && ownCallIn(part);
    if (found) return found;
  }
  return undefined;
}

function partsOf(node: Node): readonly (Node | undefined)[] {
  switch (node.kind) {
    case "unary":
      return [node.operand];
    case "binary":
    case "intersection":
      return [node.left, node.right];
    case "choice":
    case "worksheet":
    case "own":
      return node.parameters;
    case "shared":
      return [node.value];
    default:
      return [];
  }
}

/** The arguments of a call as they are in one row, those that are worked out within the formula too. */
export function argumentsOf(call: OwnNode, scene: Scene, row: number): readonly Argument[] {
  return call.parameters.map((each) => each && argumentOf(each, evaluateCell(each, scene, row), scene, row));
}

/** The definition of a function by its full name: "BARY.REFLEX". */
export function definitionOf(name: string): Definition | undefined {
  const [space, own] = name.toUpperCase().split(".");
  return space === namespace ? definitions.find((definition) => definition.name === own) : undefined;
}
