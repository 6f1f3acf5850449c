import type { Ephemeris } from "./phaseSpans.js";
import type { SkyTarget } from "./skyTarget.js";

/** A target that is to be visited. */
export interface PlannedTarget extends SkyTarget, Ephemeris {
  /** How often, a whole number. */
  readonly visits: number;
  /** Open shutter of one visit, and what else it takes after that [d]. */
  readonly exposure: number;
  readonly overhead: number;
  /** Phases at which it is wanted; any where there are none. */
  readonly phases: readonly number[];
  /** Decides between targets that have as much time left. */
  readonly value: number;
}
