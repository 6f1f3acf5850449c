import type { Formula } from "../../../sheet/formula/formula.js";
import type { Node, Parameters } from "../../../sheet/formula/node.js";
import type { Bound, Reference } from "../../../sheet/formula/reference.js";
import { isMatrix } from "../../../sheet/values/operand.js";
import type { Taking } from "./rangeArguments.js";
import { givesOneValue, takesArrays, takingOf } from "./rangeArguments.js";

/** What of a formula is more than one value where one is taken. */
export interface ArraySurvey {
  /** Whether it can only be stored as an array formula: stored plainly it would take one cell of a range. */
  readonly needsArray: boolean;
  /** The references, by index, to several cells where one value is taken. */
  readonly ranges: readonly number[];
}

/** `isOneCell` tells of a defined name whether it stands for one value. */
export function surveyArrays(formula: Formula, isOneCell: (name: string) => boolean): ArraySurvey {
  const ranges: number[] = [];
  let needsArray = false;

  const visitAll = (parameters: Parameters, taking: (index: number) => Taking): void => {
    for (const [index, each] of parameters.entries()) {
      if (each !== undefined) {
        visit(each, taking(index));
      }
    }
  };
  const visitWorksheet = (name: string, parameters: Parameters, taken: Taking): void => {
    const isFree = taken === "free" || takesArrays(name);
    visitAll(parameters, (index) => (isFree ? "free" : takingOf(name, index)));
    needsArray ||= !isFree && !givesOneValue(name) && parameters.some((_, index) => takingOf(name, index) === "free");
  };
  const visit = (node: Node, taken: Taking): void => {
    switch (node.kind) {
      case "value":
        needsArray ||= taken === "single" && isMatrix(node.value);
        break;
      case "reference":
        if (taken === "single" && isRange(formula.references[node.index])) {
          ranges.push(node.index);
        }
        break;
      case "name":
        needsArray ||= taken === "single" && !isOneCell(node.name);
        break;
      case "spill":
      case "own":
        needsArray = true;
        visitAll(node.kind === "own" ? node.parameters : [], () => "free");
        break;
      case "unary":
        visit(node.operand, node.operator === "@" ? "whole" : withinOperator(taken));
        break;
      case "binary":
        visit(node.left, withinOperator(taken));
        visit(node.right, withinOperator(taken));
        break;
      case "intersection":
        needsArray ||= taken === "single";
        break;
      case "choice":
        visitAll(node.parameters, (index) => (index === 0 && node.name === "IF" ? withinOperator(taken) : taken));
        break;
      case "worksheet":
        visitWorksheet(node.called.name, node.parameters, taken);
        break;
      case "position":
        needsArray ||= node.of?.kind === "reference" ? isRange(formula.references[node.of.index]) : !!node.of;
        break;
      case "shared":
        visit(node.value, taken);
        break;
    }
  };
  visit(formula.tree, "single");
  return { needsArray: needsArray || ranges.length > 0, ranges };
}

function withinOperator(taken: Taking): Taking {
  return taken === "free" ? "free" : "single";
}

export function isRange(reference: Reference | undefined): boolean {
  return (
    reference !== undefined &&
    !(sameBound(reference.top, reference.bottom) && sameBound(reference.left, reference.right))
  );
}

function sameBound(a: Bound, b: Bound): boolean {
  return a.at === b.at && a.fixed === b.fixed;
}
