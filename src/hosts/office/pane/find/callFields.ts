import type { Definition, Input } from "../../../../functions/definition.js";
import { readArea } from "../areaText.js";
import type { Area } from "../worksheet.js";

/** What the analyst has filled in for one input. */
export interface InputField {
  /** An address, a number, or a text such as "0.47 jupiterMass"; empty where the input is left out. */
  readonly text: string;
  /** The address of the header; empty where none states the unit. */
  readonly header: string;
}

/** A call as it is being put together. */
export interface CallFields {
  readonly definition: Definition;
  /** The sheet on which the formula goes. */
  readonly sheet: string;
  readonly inputs: readonly InputField[];
  /** The unit of the result, or the address of the header of its column; empty for the function's own. */
  readonly result: string;
}

export type FieldReading =
  | { readonly is: "left out" }
  | { readonly is: "cells"; readonly area: Area; readonly text: string }
  | { readonly is: "number"; readonly value: number }
  | { readonly is: "text"; readonly text: string };

/** How a field is understood. A quantity text such as "1 d" is no address; "B2" is no quantity. */
export function readField(text: string, sheet: string): FieldReading {
  const trimmed = text.trim();
  if (trimmed === "") return { is: "left out" };
  const value = Number(trimmed);
  if (Number.isFinite(value)) return { is: "number", value };
  const area = readArea(trimmed, sheet);
  return area ? { is: "cells", area, text: trimmed } : { is: "text", text: trimmed };
}

export function takesHeader(input: Input): boolean {
  return input.takes === "quantity" || input.takes === "any quantity";
}
