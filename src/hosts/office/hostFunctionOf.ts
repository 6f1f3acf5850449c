import { CellError } from "../../call/cell.js";
import type { ArgumentCells } from "../../call/cellFunction.js";
import { cellFunctionOf } from "../../call/cellFunctionOf.js";
import { argumentNames, isRepeating } from "../../functions/argumentNames.js";
import type { Definition } from "../../functions/definition.js";
import { argumentOfHost, hostOfResult, ownMistake } from "./boundary.js";
import { hostError } from "./hostError.js";
import { hostCall } from "./invocation.js";

/** A definition as a function that the worksheet host calls. */
export function hostFunctionOf(definition: Definition): (...handedOver: unknown[]) => unknown[][] {
  const { name } = definition;
  const { once } = cellFunctionOf(definition);
  const isRepeated = isRepeating(definition.inputs.at(-1));
  const inputs = argumentNames(definition).map((input) => input.replace(/[[\]]/g, ""));

  return (...handedOver) => {
    const { values, addresses } = hostCall(isRepeated ? spread(handedOver) : handedOver);
    const given = values.map((value, index) =>
      argumentOfHost(value, inputs[index] ?? `argument ${index + 1}`, name, addresses[index]),
    );
    const refused = given.find((argument) => argument instanceof CellError);
    if (refused) throw hostError(refused.code, refused.message);
    return hostOfResult(answered(given as (ArgumentCells | undefined)[]), name);
  };

  function answered(given: readonly (ArgumentCells | undefined)[]) {
    try {
      return once(given);
    } catch (mistake) {
      globalThis.reportError?.(mistake);
      throw hostError("#VALUE!", ownMistake(name, `it stopped with ${mistake}`).message);
    }
  }
}

/** The host hands over an argument that repeats as one list of ranges; what is no such list stays as it is. */
function spread(handedOver: readonly unknown[]): readonly unknown[] {
  return handedOver.flatMap((value) => (isListOfRanges(value) ? value : [value]));
}

function isListOfRanges(value: unknown): value is readonly unknown[] {
  const isRange = (one: unknown) => Array.isArray(one) && one.every(Array.isArray);
  return Array.isArray(value) && value.some(isRange) && value.every((one) => one === null || isRange(one));
}
