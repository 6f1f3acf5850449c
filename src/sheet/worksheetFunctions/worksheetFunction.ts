import type { Operand } from "../values/operand.js";

/** What a function calls one of its arguments. */
export interface ParameterName {
  readonly name: string;
  readonly optional: boolean;
  /** It, or the group it stands in, may be given again and again. */
  readonly repeating: boolean;
}

/** A function that worksheet files commonly contain, as formulas call it. */
export interface WorksheetFunction {
  /** Capital letters: "STDEV.S". */
  readonly name: string;
  readonly leastArguments: number;
  /** Infinity where the last arguments repeat. */
  readonly mostArguments: number;
  /** In their order; where it is not known, undefined. */
  readonly parameterNames?: readonly ParameterName[];
  /**
   * The value for the arguments; undefined is an argument left empty, as in IF(A1,,2). A reference to one cell comes as
   * a 1 x 1 matrix with `reference` set. A rectangle where one cell is asked for gives a rectangle of results.
   * Never throws, and no cell of the result is NaN, infinite or undefined.
   */
  call(parameters: readonly (Operand | undefined)[]): Operand;
}
