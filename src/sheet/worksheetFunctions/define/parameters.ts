import type { Cell, CellError } from "../../../call/cell.js";
import type { Matrix, Operand } from "../../values/operand.js";
import { buildMatrix, isMatrix } from "../../values/operand.js";
import { toLogical } from "../../values/toLogical.js";
import { toNumber } from "../../values/toNumber.js";
import { toText } from "../../values/toText.js";

/** One input of a worksheet function: its name in messages, how it is read, what stands for it where it is left out. */
export interface Parameter<T> {
  readonly name: string;
  /** Whether a rectangle goes to the function as it is; otherwise the function is worked out for each of its cells. */
  readonly whole: boolean;
  /** The value of an argument that is not given; undefined where it must be given. */
  readonly absent?: () => T;
  /** Whether an empty argument, as in TAKE(A1:A9,,1), counts as not given; otherwise it is a blank cell. */
  readonly emptyIsAbsent?: boolean;
  /** Where the argument repeats to the end of the list: how many there must be at least. */
  readonly repeatsAtLeast?: number;
  /** Where the arguments repeat: the parameters that take turns. */
  readonly turn?: readonly Parameter<unknown>[];
  read(operand: Operand, what: string): T | CellError;
}

/** The types of the values that a list of parameters reads. */
export type Read<A extends readonly unknown[]> = { readonly [I in keyof A]: Parameter<A[I]> };

function scalar<T>(name: string, read: (cell: Cell, what: string) => T | CellError): Parameter<T> {
  return { name, whole: false, read: (operand, what) => read(isMatrix(operand) ? operand.at(0, 0) : operand, what) };
}

export const number = (name: string): Parameter<number> => scalar(name, toNumber);

/** A number of which the digits behind the decimal point are dropped (TRUNC). */
export const whole = (name: string): Parameter<number> =>
  scalar(name, (cell, what) => {
    const value = toNumber(cell, what);
    return typeof value === "number" ? Math.trunc(value) + 0 : value;
  });

export const text = (name: string): Parameter<string> => scalar(name, toText);

export const logical = (name: string): Parameter<boolean> => scalar(name, toLogical);

/** Any value but an error. */
export const value = (name: string): Parameter<number | string | boolean | null> => scalar(name, (cell) => cell);

/** Any value, errors included: the function looks at them instead of passing them on. */
export const anyCell = (name: string): Parameter<{ readonly cell: Cell }> => scalar(name, (cell) => ({ cell }));

/** A rectangle; a single value is a rectangle of one. */
export const matrix = (name: string): Parameter<Matrix> => ({
  name,
  whole: true,
  read: (operand) => (isMatrix(operand) ? operand : buildMatrix(1, 1, () => operand)),
});

/** A value or a rectangle as it came; the holder keeps an error from being passed on before the function looks. */
export const anything = (name: string): Parameter<{ readonly operand: Operand }> => ({
  name,
  whole: true,
  read: (operand) => ({ operand }),
});

export function optional<T>(parameter: Parameter<T>, absent: T): Parameter<T> {
  return { ...parameter, absent: () => absent };
}

/** Optional, and an empty argument is an argument that is not given. */
export function omittable<T>(parameter: Parameter<T>, absent: T): Parameter<T> {
  return { ...parameter, absent: () => absent, emptyIsAbsent: true };
}

/** The rest of the arguments, read one by one alike. */
export function rest<T>(parameter: Parameter<T>, least = 1): Parameter<readonly T[]> {
  return { name: parameter.name, whole: false, turn: [parameter], repeatsAtLeast: least, read: () => [] };
}

/** The rest of the arguments in pairs, as range and criterion. */
export function restInPairs<A, B>(
  first: Parameter<A>,
  second: Parameter<B>,
  least = 2,
): Parameter<readonly (readonly [A, B])[]> {
  return { name: first.name, whole: false, turn: [first, second], repeatsAtLeast: least, read: () => [] };
}
