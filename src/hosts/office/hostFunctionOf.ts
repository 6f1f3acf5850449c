import { CellError } from "../../call/cell.js";
import type { ArgumentCells } from "../../call/cellFunction.js";
import { cellFunctionOf } from "../../call/cellFunctionOf.js";
import { argumentNames } from "../../functions/argumentNames.js";
import type { Definition } from "../../functions/definition.js";
import { argumentOfHost, hostOfResult, ownMistake } from "./boundary.js";
import { hostError } from "./hostError.js";
import { hostCall } from "./invocation.js";

/** A definition as a function that the worksheet host calls. */
export function hostFunctionOf(definition: Definition): (...handedOver: unknown[]) => unknown[][] {
  const { name } = definition;
  const { once } = cellFunctionOf(definition);
  const inputs = argumentNames(definition).map((input) => input.replace(/[[\]]/g, ""));

  return (...handedOver) => {
    const { values, addresses } = hostCall(handedOver);
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
