import type { Block, Column } from "./column.js";

/** One argument of one call: a rectangle of cells (1 x 1 for a scalar), or undefined where it was left out. */
export type Argument = ArgumentCells | undefined;

export interface ArgumentCells {
  readonly block: Block;
  /** The address of the first cell, for messages ("D$1"), where the host knows it. */
  readonly address?: string;
}

/**
 * One argument of many calls, one a row: the same cells in every row (headers, constants), or cells of its own
 * in each row, one column or several side by side (a value with its uncertainties).
 */
export type RowArgument = { readonly fixed: Argument } | RowCells;

export interface RowCells {
  readonly perRow: readonly Column[];
  /** The address of the first row's first cell ("C2"), where the host knows it. */
  readonly address?: string;
}

/**
 * A cell function as every host calls it. Both forms give the same bits: `eachRow` over n rows is n calls of `once`.
 * They never throw for anything the cells hold; an exception is a bug of ours.
 */
export interface CellFunction {
  /** Full name in a formula, capital letters: "BARY.REFLEX". */
  readonly name: string;
  readonly leastArguments: number;
  readonly mostArguments: number;
  /** The arguments by name, those that may be left out in square brackets. */
  readonly argumentNames?: readonly string[];
  /** One call; a column argument gives a column, so the result may have many rows. */
  once(parameters: readonly Argument[]): Block;
  /**
   * As many calls as rows. The result has `rows` rows and as many columns as the widest of the calls; where a call
   * gave fewer (no uncertainty in that row) the rest of its row is blank.
   */
  eachRow(rows: number, parameters: readonly RowArgument[]): Block;
  /** The unit, in VOUnits spelling, of the numbers that `once` gives for these arguments; undefined for texts. */
  unitOf?(parameters: readonly Argument[]): string | undefined;
}
