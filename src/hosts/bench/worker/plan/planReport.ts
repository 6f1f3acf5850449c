import { leftOutOf } from "../../../../plan/leftOutOf.js";
import type { Plan } from "../../../../plan/plan.js";
import { tellChosen } from "../../../../plan/tellPlan.js";
import { tellSchedule, tellVisitsLacking } from "../../../../plan/tellSchedule.js";
import type { PlanReport } from "../../protocol/plan.js";

/** A plan as the panel tells it; `firstRow` is the sheet's row of the table's first. */
export function planReport(
  plan: Plan,
  excluded: readonly string[],
  { sheet, version, firstRow }: { readonly sheet: number; readonly version: number; readonly firstRow: number },
): PlanReport {
  const { table, choice, chosen, schedule } = plan;
  const lacking = new Map(schedule.shortfalls.map((shortfall) => [shortfall.target, tellVisitsLacking(shortfall)]));
  return {
    sheet,
    version,
    sentences: [tellChosen(plan), tellSchedule(schedule, chosen.length), ...table.notes],
    totals: {
      value: choice.value,
      hours: choice.hours,
      budget: choice.budget,
      visits: schedule.visits.length,
      nights: schedule.nights,
      darkHours: schedule.darkHours,
    },
    chosen: chosen.map(({ row, name, value, hours, planned }, target) => ({
      row: firstRow + row,
      name,
      value,
      hours,
      visits: planned.visits,
      lacks: lacking.get(target),
    })),
    leftOut: leftOutOf(plan, excluded).map((each) => ({ ...each, row: firstRow + each.row })),
  };
}
