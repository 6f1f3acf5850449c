import type { UnitProblem } from "../units/problem.js";
import type { QuantityReading } from "../units/quantityReading.js";
import type { Quantity } from "./quantity.js";

/** Batch form of a kernel: fills the first `rows` entries of `out` from columns of base-unit numbers. */
export type Compute = (rows: number, out: Float64Array, ...columns: Float64Array[]) => void;

/** A number with a unit, of a stated quantity. */
export interface QuantityInput {
  readonly takes: "quantity";
  readonly name: string;
  readonly quantity: Quantity;
  /** In the base unit of the quantity's kind; undefined where the input is required. */
  readonly fallback: number | undefined;
  /** What the fallback means, for the help: "90 deg". */
  readonly fallbackText: string | undefined;
  /** The last input of its function, given once or more; the computation receives a column for each. */
  readonly repeats?: true;
  /** It has no uncertainty in the cells beside it, which could be taken for more of its kind; a text may state one. */
  readonly alone?: true;
  /**
   * The fallback holds only while those other inputs are 0; where one is not, this input must be given. Here a blank cell
   * and 0 are the same, since a worksheet may hand one over as the other.
   */
  readonly needed?: { readonly by: readonly string[]; readonly because: string };
}

/** A number in any unit of any kind. */
export interface AnyQuantityInput {
  readonly takes: "any quantity";
  readonly name: string;
}

/**
 * One of a few words; the computation receives the word's place in the list. The first is the fallback where the input
 * is not required.
 */
export interface WordInput {
  readonly takes: "word";
  readonly name: string;
  readonly required?: true;
  readonly words: readonly { readonly word: string; readonly meaning: string }[];
}

/** Any text: a header, a quantity text, the name of a constant. */
export interface TextInput {
  readonly takes: "text";
  readonly name: string;
  readonly meaning: string;
}

/** How many results to give below each other, 1 where left out; the computation receives the place of each, from 1. */
export interface CountInput {
  readonly takes: "count";
  readonly name: string;
  readonly meaning: string;
  readonly most: number;
}

export type Input = QuantityInput | AnyQuantityInput | WordInput | TextInput | CountInput;

/** A call as typed, and what the world outside says it gives. */
export interface Example {
  readonly cells: readonly string[];
  /** Unit asked for with the result header; the definition's own where absent. */
  readonly result?: string;
  readonly gives: string;
  readonly because: string;
}

interface Common {
  readonly name: string;
  /** The question an analyst asks when this function is the answer. */
  readonly question: string;
  /** Formula in symbols, then what the symbols are. */
  readonly formula: string;
  readonly source: string;
  /** What a user must know before trusting the result. */
  readonly note?: string;
  readonly examples: readonly [Example, ...Example[]];
}

/** Quantities in, one quantity out. */
export interface NumberDefinition extends Common {
  readonly form: "number";
  readonly inputs: readonly (QuantityInput | WordInput | CountInput)[];
  readonly result: {
    readonly quantity: Quantity;
    readonly unit: string;
    /** The input, an instant, in whose own unit the result is given instead. */
    readonly as?: string;
  };
  readonly compute: Compute;
  /** The same before the result is made whole: what uncertainties follow, since steps have no slope. */
  readonly beforeRounding?: Compute;
  /**
   * A whole number that the values decide and their uncertainties leave as it is, such as the turns that have passed. It is
   * computed once and stands last among the columns of `compute`.
   */
  readonly settle?: Compute;
  /**
   * By name of an input: how far it may move before the result bends, in base units, where that is not the size of the
   * value. Derivatives are taken within a small part of it.
   */
  readonly scales?: Readonly<Record<string, Compute>>;
  /** Why values inside their ranges may have no result together, and what to do: ends a sentence. */
  readonly unanswered?: string;
}

/** One quantity in, the same quantity out, in the unit asked for. */
export interface ConversionDefinition extends Common {
  readonly form: "conversion";
  readonly inputs: readonly [AnyQuantityInput];
}

/** One quantity in, a text out. */
export interface TextDefinition extends Common {
  readonly form: "text";
  readonly inputs: readonly [AnyQuantityInput];
  readonly compose: (quantity: QuantityReading) => string;
}

/** A text in; a text, or a number in base units, out. Takes no headers. */
export interface LookupDefinition extends Common {
  readonly form: "lookup";
  readonly inputs: readonly [TextInput];
  readonly takesResult: boolean;
  readonly answer: (text: string) => LookupAnswer;
}

export type LookupAnswer =
  | { readonly text: string }
  | { readonly value: number; readonly unit: string }
  | { readonly problem: "no unit stated"; readonly text: string }
  | { readonly problem: "unknown name"; readonly text: string; readonly nearest: string | undefined }
  | { readonly problem: "unit"; readonly unit: UnitProblem };

/** Everything there is to say about one cell function. */
export type Definition = NumberDefinition | ConversionDefinition | TextDefinition | LookupDefinition;

export function required(quantity: Quantity, name: string = quantity.name): QuantityInput {
  return { takes: "quantity", name, quantity, fallback: undefined, fallbackText: undefined };
}

export function optional(quantity: Quantity, fallback: number, fallbackText: string): QuantityInput {
  return { takes: "quantity", name: quantity.name, quantity, fallback, fallbackText };
}

export function repeating(quantity: Quantity): QuantityInput {
  return { ...required(quantity), repeats: true, alone: true };
}

/** An input that may be left out only while others are 0. */
export function neededBy(
  by: readonly string[],
  because: string,
  quantity: Quantity,
  fallback: number,
  fallbackText: string,
): QuantityInput {
  return { ...optional(quantity, fallback, fallbackText), needed: { by, because } };
}
