import type { Plan } from "./plan.js";
import { hoursText } from "./tellChoice.js";
import { tellVisitsLacking } from "./tellSchedule.js";

/** A row of the table that is not in the plan. */
export interface LeftOut {
  /** Counted from 0 among the rows of data. */
  readonly row: number;
  readonly name: string;
  readonly because: string;
}

/** Every row that is not in a plan and why, in the order of the table. */
export function leftOutOf({ table, choice, unreachable }: Plan, excluded: readonly string[]): LeftOut[] {
  const isChosen = new Set(choice.chosen);
  const beyond = new Map(unreachable.map((shortfall) => [shortfall.target, shortfall]));
  const reasonOf = (name: string, value: number, hours: number, index: number) => {
    const shortfall = beyond.get(index);
    if (excluded.includes(name)) return "it is excluded.";
    if (shortfall) return tellVisitsLacking(shortfall);
    if (!(value > 0)) return `it is worth ${value}, and what is worth nothing is not chosen.`;
    return `its ${hoursText(hours)} do not fit beside targets that are worth more together.`;
  };
  const notChosen = table.rows.flatMap(({ row, name, value, hours }, index) =>
    isChosen.has(index) ? [] : [{ row, name, because: reasonOf(name, value, hours, index) }],
  );
  return [...notChosen, ...table.leftOut].sort((a, b) => a.row - b.row);
}
