import type { Limits } from "./limits.js";
import type { Opportunities } from "./opportunities.js";

/** Why a target did not get all its visits. */
export type Reason =
  | { readonly about: "never up" }
  | { readonly about: "phase lost"; readonly error: number }
  | { readonly about: "no phase" }
  | { readonly about: "Moon"; readonly nights: number }
  | { readonly about: "few nights"; readonly nights: number }
  | { readonly about: "nights taken"; readonly nights: number };

export interface Shortfall {
  /** Place among the targets. */
  readonly target: number;
  readonly name: string;
  readonly visits: number;
  readonly laid: number;
  readonly reason: Reason;
}

/** Undefined where the target got all of them. */
export function shortfallOf(one: Opportunities, index: number, limits: Limits): Shortfall | undefined {
  const { target, laid } = one;
  if (laid >= target.visits) return undefined;
  return { target: index, name: target.name, visits: target.visits, laid, reason: reasonOf(one, limits) };
}

function reasonOf(one: Opportunities, { perNight }: Limits): Reason {
  const { nightsUp, nightsSure, nightsInPhase, nightsMoonlit, target, laid } = one;
  if (nightsUp === 0) return { about: "never up" };
  if (nightsSure === 0) return { about: "phase lost", error: one.leastPhaseError };
  if (nightsInPhase === 0) return { about: "no phase" };
  const missing = Math.ceil((target.visits - laid) / perNight);
  if (nightsInPhase * perNight < target.visits) return { about: "few nights", nights: nightsInPhase };
  if (nightsMoonlit >= missing) return { about: "Moon", nights: nightsMoonlit };
  return { about: "nights taken", nights: nightsInPhase };
}
