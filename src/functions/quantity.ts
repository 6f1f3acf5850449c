import type { Kind } from "../units/kind.js";

/** One end of the range of a quantity, in the base unit of its kind. */
export interface Bound {
  readonly at: number;
  /** Whether the bound itself is outside the range. */
  readonly open: boolean;
  /** The bound as an analyst writes it: "0", "180 deg". */
  readonly text: string;
  /** Why the quantity ends there: a clause that follows "because". */
  readonly reason: string;
}

/** A quantity of the trade: what it is, between which bounds, and how tables head its columns. */
export interface Quantity {
  readonly name: string;
  readonly meaning: string;
  readonly kind: Kind;
  /**
   * An angle that may be written `13:08:00`, in hours or in degrees. One in hours is in hours, too, under a header in `h`,
   * which for anything else is an hour of time.
   */
  readonly sexagesimal?: "hours" | "degrees";
  /** An instant that the computation takes in this frame, "JD_UTC"; without one, it is in that of the other instants. */
  readonly frame?: string;
  /**
   * A cell that holds the number 0 is taken for a blank one, which a worksheet may hand over so, and refused: its range
   * includes 0, and a true 0 is typed with its unit.
   */
  readonly zeroIsBlank?: true;
  readonly lower: Bound | undefined;
  readonly upper: Bound | undefined;
  /** Unit of its columns, in which examples are given. */
  readonly unit: string;
  /** A value that works, in that unit. */
  readonly example: number;
  /** A change that matters, in the base unit: the step for derivatives where the value itself is 0. */
  readonly step: number;
  /** Where the median of a column of this quantity lies in practice, in the base unit; outside, its unit is doubted. */
  readonly plausible: { readonly least: number; readonly most: number } | undefined;
  /** What columns of this quantity are called, besides its name; capitals ignored. */
  readonly headers: readonly string[];
}

export function above(at: number, text: string, reason: string): Bound {
  return { at, open: true, text, reason };
}

export const below = above;

export function atLeast(at: number, text: string, reason: string): Bound {
  return { at, open: false, text, reason };
}

export const atMost = atLeast;
