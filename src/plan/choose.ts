import { fillBudget } from "./fillBudget.js";
import { runAll, type Steps } from "./watch.js";

/** A target that costs time and is worth something. */
export interface Candidate {
  readonly name: string;
  /** Telescope time [h], above 0. */
  readonly hours: number;
  readonly value: number;
}

export interface Wish {
  readonly candidates: readonly Candidate[];
  /** Telescope time there is [h]. */
  readonly budget: number;
  /** Places among the candidates of those that have to be in, whatever they cost. */
  readonly must: ReadonlySet<number>;
  /** And of those that must not. */
  readonly excluded: ReadonlySet<number>;
}

/** Places are in the order of the candidates. */
export interface Choice {
  readonly feasible: true;
  readonly chosen: readonly number[];
  /** Sum of the values. */
  readonly value: number;
  /** Sum of the hours, each rounded up to the minute. */
  readonly hours: number;
  readonly budget: number;
}

/** The targets that have to be in cost more than there is. */
export interface Infeasible {
  readonly feasible: false;
  readonly needed: number;
  readonly budget: number;
  /** Those that, no longer wanted at all costs, lose the least value and let the rest fit. */
  readonly release: readonly number[];
}

/**
 * The targets whose values sum to the most within a budget. Exact: no other choice sums to more. Hours count in minutes,
 * those of a target rounded up and the budget down, so that the budget is never overrun. Of choices that are worth the
 * same, that of the fewest minutes; of these, the one whose first difference comes earlier in the table. What is worth
 * nothing is not chosen.
 */
export function choose(wish: Wish): Choice | Infeasible {
  return runAll(chooseSteps(wish));
}

export function* chooseSteps({ candidates, budget, must, excluded }: Wish): Steps<Choice | Infeasible> {
  const minutes = candidates.map(({ hours }) => minutesOf(hours));
  const room = Math.floor(budget * 60 + rounding);
  const fixed = [...must].sort((a, b) => a - b);
  const fixedMinutes = sum(fixed.map((index) => minutes[index]!));
  const itemOf = (index: number) => ({ minutes: minutes[index]!, value: candidates[index]!.value });
  if (fixedMinutes > room) {
    // A target that is worth nothing is still kept where it fits.
    const worth = Math.max(...fixed.map((index) => candidates[index]!.value), 0) * 1e-6 || 1;
    const items = fixed.map((index) => ({ ...itemOf(index), value: Math.max(candidates[index]!.value, 0) + worth }));
    const kept = yield* fillBudget(items, room);
    const release = fixed.filter((_, place) => !kept.includes(place));
    return { feasible: false, needed: fixedMinutes / 60, budget, release };
  }
  const free = candidates.flatMap(({ value }, index) =>
    value > 0 && !must.has(index) && !excluded.has(index) ? [index] : [],
  );
  const filled = yield* fillBudget(free.map(itemOf), room - fixedMinutes);
  const chosen = [...fixed, ...filled.map((place) => free[place]!)].sort((a, b) => a - b);
  return {
    feasible: true,
    chosen,
    value: sum(chosen.map((index) => candidates[index]!.value)),
    hours: sum(chosen.map((index) => minutes[index]!)) / 60,
    budget,
  };
}

/** What 0.1 h x 60 may lie above 6 by rounding [min]. */
const rounding = 1e-6;

function minutesOf(hours: number): number {
  return Math.max(1, Math.ceil(hours * 60 - rounding));
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
