import type { Candidate, Infeasible } from "./choose.js";

/** Hours to the minute's worth of digits, without trailing zeros: "12.5 h". */
export function hoursText(hours: number): string {
  return `${Number(hours.toFixed(2))} h`;
}

/** As many as a message has room for. */
const mostNames = 3;

/** Which constraint to relax, and by how much. */
export function tellInfeasible({ needed, budget, release }: Infeasible, candidates: readonly Candidate[]): string {
  const names = release
    .slice(0, mostNames)
    .map((index) => `${candidates[index]!.name} (${hoursText(candidates[index]!.hours)})`);
  return `the targets that have to be in need ${hoursText(needed)} and the budget is ${hoursText(budget)}; raise it to ${hoursText(Math.ceil(needed * 100) / 100)}, or do without ${release.length > mostNames ? `${names.join(", ")} and ${release.length - mostNames} more` : listed(names)}.`;
}

export function listed(names: readonly string[]): string {
  return names.length < 2 ? names.join("") : `${names.slice(0, -1).join(", ")} and ${names.at(-1)}`;
}
