import type { Unit } from "./unit.js";

/** A number as text states it, with its uncertainties and its unit where it states them; numbers in that unit. */
export interface QuantityReading {
  readonly value: number;
  readonly upper: number | undefined;
  readonly lower: number | undefined;
  readonly unit: Unit | undefined;
  /** The value as it was written, where that has more digits than one double holds. */
  readonly digits?: string;
}
