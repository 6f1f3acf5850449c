import { nearest } from "../units/nearest.js";
import { type Choice, chooseSteps, type Infeasible } from "./choose.js";
import type { Limits } from "./limits.js";
import type { PlanRow, PlanTable } from "./planTable.js";
import { outlookSteps, type Schedule, scheduleSteps, unreachable } from "./schedule.js";
import type { Shortfall } from "./shortfall.js";
import type { Site } from "./site.js";
import { tellInfeasible } from "./tellChoice.js";
import type { Steps } from "./watch.js";

export interface PlanRequest {
  readonly table: PlanTable;
  /** Telescope time there is [h]. */
  readonly budget: number;
  /** Names of targets that have to be in, and of those that must not. */
  readonly must: readonly string[];
  readonly excluded: readonly string[];
  readonly site: Site;
  /** Dates of the first and of the last night [d from J2000.0]. */
  readonly from: number;
  readonly to: number;
  readonly limits: Limits;
}

/** Which targets, and when. */
export interface Plan {
  readonly table: PlanTable;
  readonly choice: Choice;
  /** The chosen rows, in the order of the table; the targets of the schedule. */
  readonly chosen: readonly PlanRow[];
  readonly schedule: Schedule;
  /** Rows that were not offered to the choice because their visits do not fit into the dates; places in the table. */
  readonly unreachable: readonly Shortfall[];
}

/** Why there is no plan: a name that means no target, or more wishes than hours. */
export interface NoPlan {
  readonly about: "names" | "hours";
  readonly problem: string;
}

/**
 * Leaves out the targets that cannot have all their visits in these dates, chooses of the others, then lays the visits; a
 * sentence where the wish cannot be granted, and which constraint to relax.
 */
export function* planSteps(request: PlanRequest): Steps<Plan | NoPlan> {
  const { table, budget, site, from, to, limits } = request;
  const must = placesOf(table, request.must, "has to be in");
  const excluded = placesOf(table, request.excluded, "is excluded");
  const problem = [...must.problems, ...excluded.problems, ...contradictions(table, must.places, excluded.places)];
  if (problem.length > 0) return { about: "names", problem: problem.join(" ") };
  const everything = { targets: table.rows.map(({ planned }) => planned), site, from, to, limits };
  const beyond = unreachable(yield* outlookSteps(everything), everything).filter(
    ({ target }) => !must.places.has(target),
  );
  const left = new Set([...excluded.places, ...beyond.map(({ target }) => target)]);
  const wish = { candidates: table.rows, budget, must: must.places, excluded: left };
  const choice: Choice | Infeasible = yield* chooseSteps(wish);
  if (!choice.feasible) return { about: "hours", problem: tellInfeasible(choice, table.rows) };
  const chosen = choice.chosen.map((index) => table.rows[index]!);
  const targets = chosen.map(({ planned }) => planned);
  const schedule = yield* scheduleSteps({ targets, site, from, to, limits });
  return { table, choice, chosen, schedule, unreachable: beyond };
}

/** Every row of each name; a name that is in no row is told, and so is one whose row cannot be planned. */
function placesOf({ rows, leftOut }: PlanTable, names: readonly string[], wanted: "has to be in" | "is excluded") {
  const places = new Set<number>();
  const problems: string[] = [];
  for (const name of names) {
    const found = rows.flatMap((row, index) => (row.name === name ? [index] : []));
    for (const index of found) places.add(index);
    if (found.length > 0) continue;
    const spoilt = leftOut.find((row) => row.name === name);
    if (spoilt && wanted === "is excluded") continue;
    const near = nearest(
      name,
      [...rows, ...leftOut].map((row) => row.name),
    );
    problems.push(
      spoilt
        ? `"${name}" ${wanted}, but cannot be planned: ${spoilt.because}`
        : `"${name}" ${wanted}, but no target has that name; ${near ? `did you mean "${near}"?` : "write it as in the table."}`,
    );
  }
  return { places, problems };
}

function contradictions({ rows }: PlanTable, must: ReadonlySet<number>, excluded: ReadonlySet<number>): string[] {
  return [...must].flatMap((index) =>
    excluded.has(index) ? [`"${rows[index]!.name}" has to be in and is excluded; take back one of the two.`] : [],
  );
}
