import { cellAt } from "../../call/column.js";
import type { Plan } from "../../plan/plan.js";
import type { Shortfall } from "../../plan/shortfall.js";
import { tellShortfall } from "../../plan/tellSchedule.js";
import { visitTable } from "../../plan/visitTable.js";

/** A plan as scripts read it, with every digit; hours are telescope time. */
export function planJson(plan: Plan): object {
  const { table, choice, chosen, schedule, unreachable } = plan;
  const isChosen = new Set(choice.chosen);
  const targetOf = ({ name, value, hours }: { name: string; value: number; hours: number }) => ({ name, value, hours });
  const { header, columns } = visitTable(plan);
  return {
    budget: choice.budget,
    hours: choice.hours,
    value: choice.value,
    chosen: chosen.map(targetOf),
    notChosen: table.rows.filter((_, index) => !isChosen.has(index)).map(targetOf),
    visits: schedule.visits.map((_, row) =>
      Object.fromEntries(header.map((name, index) => [name, cellAt(columns[index]!, row)])),
    ),
    hoursLaid: schedule.hours,
    nights: schedule.nights,
    darkHours: schedule.darkHours,
    shortfalls: schedule.shortfalls.map(shortfallJson),
    unreachable: unreachable.map(shortfallJson),
    leftOut: table.leftOut.map(({ row, name, because }) => ({ row: row + 1, name, because })),
    notes: table.notes,
  };
}

function shortfallJson(one: Shortfall): object {
  return { name: one.name, visits: one.visits, laid: one.laid, because: tellShortfall(one) };
}
