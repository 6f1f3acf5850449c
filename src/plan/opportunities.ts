import { day, speedOfLight } from "../kernel/constants.js";
import type { Limits } from "./limits.js";
import type { Night } from "./nights.js";
import { phaseError, phaseSpans } from "./phaseSpans.js";
import type { PlannedTarget } from "./plannedTarget.js";
import type { Site } from "./site.js";
import { dot, skyVector, spansUp } from "./skyTarget.js";

/** When the shutter may open [d from J2000.0 UTC] for a visit at one of the phases wanted. */
export interface Opening {
  readonly from: number;
  readonly to: number;
  /** Place among the phases; 0 where any will do. */
  readonly phase: number;
}

/** One target while it is planned: where it can be visited, and what has been laid. */
export interface Opportunities {
  readonly target: PlannedTarget;
  readonly vector: Float64Array;
  /** Openings, night by night. */
  readonly openings: (readonly Opening[])[];
  /** Nights in which it is up long enough; of these, those whose phase is known well enough; of these, those in phase. */
  nightsUp: number;
  nightsSure: number;
  nightsInPhase: number;
  /** Nights in phase that are still to come. */
  nightsLeft: number;
  /** Nights in phase in which the Moon was too near. */
  nightsMoonlit: number;
  /** Least standard uncertainty of its phase in the nights that it is up. */
  leastPhaseError: number;
  laid: number;
  /** Laid at each phase. */
  readonly laidAt: number[];
  /** End of its last visit [d from J2000.0 UTC]. */
  lastEnd: number;
}

export function opportunitiesOf(target: PlannedTarget): Opportunities {
  return {
    target,
    vector: skyVector(target),
    openings: [],
    nightsUp: 0,
    nightsSure: 0,
    nightsInPhase: 0,
    nightsLeft: 0,
    nightsMoonlit: 0,
    leastPhaseError: Number.POSITIVE_INFINITY,
    laid: 0,
    laidAt: [],
    lastEnd: Number.NEGATIVE_INFINITY,
  };
}

/** Adds a night: when the target is up in the dark, long enough and with a phase that is wanted. */
export function noteNight(one: Opportunities, night: Night, site: Site, lowest: number, limits: Limits): void {
  const { target, vector } = one;
  const { exposure } = target;
  const up = spansUp(vector, night, site, lowest).filter(({ from, to }) => to - from >= exposure);
  if (up.length === 0) {
    one.openings.push([]);
    return;
  }
  one.nightsUp++;
  // The greater of those at the two ends of the night.
  const error = Math.max(phaseError(target, night.midnight - 0.5), phaseError(target, night.midnight + 0.5));
  one.leastPhaseError = Math.min(one.leastPhaseError, error);
  // How far the barycentre's clock is ahead of UTC.
  const lead = night.tdbLessUtc + dot(night.earth, vector) / speedOfLight / day;
  const width = limits.phaseWidth - error - lightSlack / target.period;
  const openings = up.flatMap((span): Opening[] => {
    const within = { from: span.from, to: span.to - exposure };
    if (target.phases.length === 0) return [{ ...within, phase: 0 }];
    return target.phases.flatMap((wanted, phase) =>
      phaseSpans(target, wanted, width, within, lead + exposure / 2).map((opening) => ({ ...opening, phase })),
    );
  });
  one.openings.push(openings);
  if (target.phases.length === 0 || error < limits.phaseWidth) one.nightsSure++;
  if (openings.length > 0) {
    one.nightsInPhase++;
    one.nightsLeft++;
  }
}

/** Light time is taken at midnight, and by either end of the night the Earth has moved 2 s of it [d]. */
const lightSlack = 4 / 86400;
