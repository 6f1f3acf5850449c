import type { Plan } from "./plan.js";
import { hoursText, listed } from "./tellChoice.js";
import { tellSchedule, tellShortfall } from "./tellSchedule.js";

const mostNames = 20;

/** What was chosen and laid, what was left out and why, what was taken for granted: one sentence a line. */
export function tellPlan(plan: Plan): string[] {
  const { table, choice, chosen, schedule, unreachable } = plan;
  const { rows, leftOut, notes } = table;
  const isChosen = new Set(choice.chosen);
  const isBeyond = new Set(unreachable.map(({ target }) => target));
  const others = rows.filter((_, index) => !isChosen.has(index) && !isBeyond.has(index));
  return [
    tellChosen(plan),
    ...(others.length > 0
      ? [`Not chosen: ${names(others.map((row) => `${row.name} (${hoursText(row.hours)})`))}.`]
      : []),
    ...(unreachable.length > 0 ? ["Not offered to the choice, because their visits do not fit into these dates:"] : []),
    ...unreachable.map((shortfall) => `  ${tellShortfall(shortfall)}`),
    tellSchedule(schedule, chosen.length),
    ...schedule.shortfalls.map((shortfall) => `  ${tellShortfall(shortfall)}`),
    ...leftOut.map(({ row, name, because }) => `Row ${row + 1}, ${name}, cannot be planned: ${because}`),
    ...notes,
  ];
}

/** What was chosen, in one sentence. */
export function tellChosen({ table, choice: { hours, budget, value }, chosen }: Plan): string {
  return `${chosen.length} of ${table.rows.length} targets chosen, worth ${Number(value.toPrecision(12))}, for ${hoursText(hours)} of ${hoursText(budget)}.`;
}

function names(all: readonly string[]): string {
  return all.length <= mostNames
    ? listed(all)
    : `${all.slice(0, mostNames).join(", ")} and ${all.length - mostNames} more`;
}
