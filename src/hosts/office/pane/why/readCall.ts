import { type AstExpression, parse, tokenize } from "@borgar/fx";
import { namespace } from "../../../../call/cellFunctionOf.js";
import type { Definition } from "../../../../functions/definition.js";
import { definitions } from "../../../../functions/definitions.js";
import { readArea } from "../areaText.js";
import type { Area } from "../worksheet.js";

/** One argument of a call as it stands in a formula. */
export type CallArgument =
  | { readonly is: "left out" }
  | { readonly is: "cells"; readonly area: Area; readonly text: string }
  /** All that the formula in the first cell filled: `B2#`. */
  | { readonly is: "spill"; readonly area: Area; readonly text: string }
  | { readonly is: "value"; readonly value: number | string | boolean }
  /** Texts and cells put together with &. */
  | { readonly is: "joined"; readonly parts: readonly CallArgument[] }
  /** Worked out within the formula by something else than our functions. */
  | { readonly is: "worked out" };

export interface FormulaCall {
  readonly definition: Definition;
  readonly parameters: readonly CallArgument[];
  /** The call is the whole formula, not a part of it. */
  readonly whole: boolean;
}

/** The first call of one of our functions in a formula, from the outside in; undefined where there is none. */
export function readCall(formula: string, sheet: string): FormulaCall | undefined {
  const root = parsed(formula);
  const found = root && firstCall(root);
  if (!found) return undefined;
  const parameters = found.call.arguments.map((argument) => argumentOf(argument, sheet));
  return { definition: found.definition, parameters, whole: found.call === root };
}

type CallExpression = Extract<AstExpression, { type: "CallExpression" }>;

function parsed(formula: string): AstExpression | undefined {
  try {
    return parse(tokenize(formula, { withLocation: true })) as AstExpression;
  } catch {
    // The host holds formulas in forms that this grammar does not know; they are none of ours to explain.
    return undefined;
  }
}

function firstCall(node: AstExpression): { call: CallExpression; definition: Definition } | undefined {
  if (!("arguments" in node)) return undefined;
  const definition =
    node.type === "CallExpression" && "name" in node.callee ? definitionNamed(node.callee.name) : undefined;
  if (definition) return { call: node as CallExpression, definition };
  for (const argument of node.arguments) {
    const found = argument && firstCall(argument as AstExpression);
    if (found) return found;
  }
  return undefined;
}

/** As typed, `BARY.REFLEX`, or as workbook files spell it, `_xldudf_BARY_REFLEX`. */
function definitionNamed(name: string): Definition | undefined {
  const own = new RegExp(`^(?:_xldudf_)?${namespace}[._]([A-Z0-9]+)$`, "i").exec(name)?.[1]?.toUpperCase();
  return definitions.find((definition) => definition.name === own);
}

function argumentOf(node: AstExpression | null | undefined, sheet: string): CallArgument {
  if (!node) return { is: "left out" };
  if (node.type === "Literal") return { is: "value", value: node.value as number | string | boolean };
  if (node.type === "ReferenceIdentifier") {
    const area = readArea(node.value, sheet);
    return area ? { is: "cells", area, text: node.value } : { is: "worked out" };
  }
  if (node.type === "UnaryExpression")
    return unaryOf(node.operator, argumentOf(node.arguments[0] as AstExpression, sheet));
  if (node.type === "BinaryExpression" && node.operator === "&") {
    const parts = node.arguments.map((part) => argumentOf(part as AstExpression, sheet));
    return { is: "joined", parts: parts.flatMap((part) => (part.is === "joined" ? part.parts : [part])) };
  }
  return { is: "worked out" };
}

function unaryOf(operator: string, operand: CallArgument): CallArgument {
  if (operator === "#" && operand.is === "cells") return { ...operand, is: "spill", text: `${operand.text}#` };
  if (operator === "-" && operand.is === "value" && typeof operand.value === "number") {
    return { is: "value", value: -operand.value };
  }
  return operator === "+" ? operand : { is: "worked out" };
}
