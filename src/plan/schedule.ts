import { altitudeOfAirmass } from "../kernel/night/airmass.js";
import type { Limits } from "./limits.js";
import { NightPlan } from "./nightPlan.js";
import { type Night, nightOf } from "./nights.js";
import { noteNight, type Opportunities, opportunitiesOf } from "./opportunities.js";
import type { PlannedTarget } from "./plannedTarget.js";
import { type Shortfall, shortfallOf } from "./shortfall.js";
import type { Site } from "./site.js";
import type { Visit } from "./visit.js";
import type { Steps } from "./watch.js";

export interface Schedule {
  /** In the order of time. */
  readonly visits: readonly Visit[];
  /** Telescope time of the visits with their overheads [h]. */
  readonly hours: number;
  /** Hours of darkness there were [h]. */
  readonly darkHours: number;
  readonly nights: number;
  /** Targets that got fewer visits than they need, with the reason. */
  readonly shortfalls: readonly Shortfall[];
}

export interface ScheduleRequest {
  readonly targets: readonly PlannedTarget[];
  readonly site: Site;
  /** Dates of the first and of the last night [d from J2000.0]. */
  readonly from: number;
  readonly to: number;
  readonly limits: Limits;
}

/** Every night, and when each target can be visited in it. */
export interface Outlook {
  readonly nights: readonly Night[];
  readonly opportunities: readonly Opportunities[];
}

/** The first half of a schedule, before anything is laid. */
export function* outlookSteps({ targets, site, from, to, limits }: ScheduleRequest): Steps<Outlook> {
  const lowest = altitudeOfAirmass(limits.airmass);
  const first = Math.floor(from + 0.5) - 0.5;
  const count = Math.max(0, Math.floor(to + 0.5) - 0.5 - first + 1);
  const nights: Night[] = [];
  const opportunities = targets.map(opportunitiesOf);
  for (let index = 0; index < count; index++) {
    const night = nightOf(first + index, site, limits.sunBelow);
    nights.push(night);
    for (const target of opportunities) noteNight(target, night, site, lowest, limits);
    yield { done: index + 1, total: 2 * count };
  }
  return { nights, opportunities };
}

/** Targets that cannot have all their visits, even if no other target took their time. */
export function unreachable({ opportunities }: Outlook, { limits }: ScheduleRequest): Shortfall[] {
  return opportunities.flatMap((one, index) =>
    one.nightsInPhase * limits.perNight < one.target.visits ? (shortfallOf(one, index, limits) ?? []) : [],
  );
}

/**
 * Lays visits on dates. Night by night, the target with the fewest spare nights comes first, then the one that is worth
 * more, then the one that comes earlier in the table; each visit stands beside what is laid already, nearest to the
 * target's highest point, at the phase that had fewest visits. No limit is ever broken; the same request gives the same
 * schedule. It is no optimum: a visit once laid is not moved for another.
 */
export function* scheduleSteps(request: ScheduleRequest): Steps<Schedule> {
  const { targets, site, limits } = request;
  const { nights, opportunities } = yield* outlookSteps(request);
  const count = nights.length;
  const visits: Visit[] = [];
  for (let index = 0; index < count; index++) {
    visits.push(...new NightPlan(nights[index]!, index, site, limits, opportunities).fill());
    yield { done: count + index + 1, total: 2 * count };
  }
  return {
    visits,
    hours: visits.reduce((sum, { target }) => sum + 24 * (targets[target]!.exposure + targets[target]!.overhead), 0),
    darkHours: nights.reduce(
      (sum, { dark }) => sum + dark.reduce((hours, span) => hours + 24 * (span.to - span.from), 0),
      0,
    ),
    nights: count,
    shortfalls: opportunities.flatMap((target, index) => shortfallOf(target, index, limits) ?? []),
  };
}
